import { Injectable } from '@nestjs/common';
import type { Role } from '@shared/roles';
import type { CreateUser, UpdateUser, UserView } from '@shared/session';
import { IsNull } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { hashPassword } from '../auth/password.js';
import { Session } from '../auth/session.entity.js';
import { Clock } from '../clock/clock.js';
import { Customer } from '../customers/customer.entity.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { User } from './user.entity.js';
import { lastManagerProblem, rolesProblem } from './user-rules.js';

interface UserRow {
  id: string;
  name: string;
  email: string;
  roles: string;
  customerId: string | null;
  customerName: string | null;
  disabledAt: string | null;
  version: number;
}
const SELECT = 'SELECT u.id, u.name, u.email, u.roles, u.customerId, c.name AS customerName, u.disabledAt, u.version FROM users u LEFT JOIN customers c ON c.id = u.customerId';

/** The people who sign in. */
@Injectable()
export class UsersService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
  ) {}

  async list(): Promise<UserView[]> {
    return (await this.db.all<UserRow>(`${SELECT} ORDER BY u.name`)).map(toView);
  }

  async create(actor: Actor, input: CreateUser): Promise<UserView> {
    const problem = rolesProblem(input.roles, input.customerId);
    if (problem) throw new AppError('INPUT_NOT_VALID', problem, { fields: [{ path: 'roles', code: 'roles', message: problem }] });
    const passwordHash = await hashPassword(input.password);
    const id = await this.unitOfWork.run(async (manager) => {
      if (input.customerId !== null && !(await manager.existsBy(Customer, { id: input.customerId }))) throw new AppError('INPUT_NOT_VALID', 'There is no such customer; look for it again.', { fields: [{ path: 'customerId', code: 'unknown', message: 'There is no such customer; look for it again.' }] });
      if (await manager.existsBy(User, { email: input.email })) throw new AppError('TAKEN', 'Somebody signs in with this e-mail already.', { fields: [{ path: 'email', code: 'taken', message: 'Somebody signs in with this e-mail already.' }] });
      const user = { id: this.ids.next(), email: input.email, name: input.name, passwordHash, roles: input.roles, customerId: input.customerId, units: 'si' as const, theme: 'system' as const, disabledAt: null, createdAt: this.clock.iso(), version: 1 };
      await manager.insert(User, user);
      await this.history.record(manager, { actor, subject: { kind: 'user', id: user.id }, event: 'user.created', words: `${input.name} may sign in as ${input.roles.join(', ')}.`, data: { roles: input.roles } });
      return user.id;
    });
    return this.one(id);
  }

  /** Roles count at the next request; a disabled user's sessions end at once. */
  async update(actor: Actor, id: string, input: UpdateUser): Promise<UserView> {
    await this.unitOfWork.run(async (manager) => {
      const user = await manager.findOneBy(User, { id });
      if (!user) throw notFound('user');
      if (user.version !== input.version) throw changedMeanwhile('user', { name: user.name, roles: user.roles, disabled: user.disabledAt !== null, version: user.version });
      const others = await manager.query<{ roles: string }[]>('SELECT roles FROM users WHERE disabledAt IS NULL AND id <> ?', [id]);
      const problem = rolesProblem(input.roles, user.customerId) ?? lastManagerProblem(input, others.map((o) => JSON.parse(o.roles) as Role[]));
      if (problem) throw new AppError('STATE_NOT_RIGHT', problem);
      const disabledAt = input.disabled ? (user.disabledAt ?? this.clock.iso()) : null;
      await manager.update(User, { id }, { name: input.name, roles: input.roles, disabledAt, version: user.version + 1 });
      if (input.disabled) await manager.update(Session, { userId: id, endedAt: IsNull() }, { endedAt: this.clock.iso() });
      await this.history.record(manager, {
        actor,
        subject: { kind: 'user', id },
        event: 'user.changed',
        words: input.disabled ? `${input.name} may not sign in any more.` : `${input.name} has the roles ${input.roles.join(', ')}.`,
        data: { from: { roles: user.roles, disabled: user.disabledAt !== null }, to: { roles: input.roles, disabled: input.disabled } },
      });
    });
    return this.one(id);
  }

  private async one(id: string): Promise<UserView> {
    const row = await this.db.one<UserRow>(`${SELECT} WHERE u.id = ?`, [id]);
    if (!row) throw notFound('user');
    return toView(row);
  }
}

const toView = (r: UserRow): UserView => ({ id: r.id, name: r.name, email: r.email, roles: JSON.parse(r.roles) as Role[], customerId: r.customerId, customerName: r.customerName, disabled: r.disabledAt !== null, version: r.version });
