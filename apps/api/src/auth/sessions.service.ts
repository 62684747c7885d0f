import { Inject, Injectable, Logger } from '@nestjs/common';
import { JwtService } from '@nestjs/jwt';
import { permissionsOf, type Role } from '@shared/roles';
import type { Me, Preferences, SignIn } from '@shared/session';
import { IsNull } from 'typeorm';
import { Clock } from '../clock/clock.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { AppError } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { ShopService } from '../shop/shop.service.js';
import { User } from '../users/user.entity.js';
import type { Actor } from './actor.js';
import { decoyCheck, passwordMatches } from './password.js';
import { SESSION_MS, TOKEN_AUDIENCE, TOKEN_ISSUER } from './session-cookie.js';
import { Session } from './session.entity.js';
import { SignInBrake } from './sign-in-brake.js';

interface LiveSession {
  userId: string;
  name: string;
  roles: string;
  customerId: string | null;
}

/** Sign-in, sign-out, and who stands behind a session right now. */
@Injectable()
export class SessionsService {
  private readonly log = new Logger('SignIn');

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly jwt: JwtService,
    private readonly brake: SignInBrake,
    private readonly shop: ShopService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async signIn(input: SignIn, address: string): Promise<{ token: string; me: Me }> {
    await this.brake.step(input.email, address);
    const user = await this.db.one<{ id: string; passwordHash: string; disabledAt: string | null }>('SELECT id, passwordHash, disabledAt FROM users WHERE email = ?', [input.email]);
    const right = user ? await passwordMatches(user.passwordHash, input.password) : await decoyCheck(input.password);
    if (!user || !right || user.disabledAt) throw new AppError('WRONG_NAME_OR_PASSWORD', 'That e-mail and password do not go together.');
    await this.brake.right(input.email, address);
    const sessionId = await this.open(user.id);
    this.log.log(`User ${user.id} signed in from ${address}`);
    const actor = await this.actorOf(sessionId);
    if (!actor) throw new AppError('WRONG_NAME_OR_PASSWORD', 'That e-mail and password do not go together.');
    return { token: this.tokenOf(sessionId), me: await this.me(actor) };
  }

  private open(userId: string): Promise<string> {
    const now = this.clock.now();
    return this.unitOfWork.run(async (manager) => {
      const id = this.ids.next();
      await manager.insert(Session, { id, userId, createdAt: now.toISOString(), lastSeenAt: now.toISOString(), expiresAt: new Date(now.getTime() + SESSION_MS).toISOString(), endedAt: null });
      return id;
    });
  }

  private tokenOf(sessionId: string): string {
    return this.jwt.sign({ sid: sessionId }, { issuer: TOKEN_ISSUER, audience: TOKEN_AUDIENCE, expiresIn: SESSION_MS / 1000 });
  }

  /** Roles come from the user as he is now: who loses a role loses it at once. */
  async actorOf(sessionId: string): Promise<Actor | undefined> {
    const row = await this.db.one<LiveSession>(
      `SELECT s.userId, u.name, u.roles, u.customerId FROM sessions s JOIN users u ON u.id = s.userId
       WHERE s.id = ? AND s.endedAt IS NULL AND s.expiresAt > ? AND u.disabledAt IS NULL`,
      [sessionId, this.clock.iso()],
    );
    if (!row) return undefined;
    const roles = JSON.parse(row.roles) as Role[];
    return { userId: row.userId, name: row.name, roles, permissions: permissionsOf(roles), customerId: row.customerId, sessionId };
  }

  async signOut(actor: Actor): Promise<void> {
    await this.unitOfWork.run((manager) => manager.update(Session, { id: actor.sessionId! }, { endedAt: this.clock.iso() }));
  }

  async signOutEverywhere(actor: Actor): Promise<void> {
    await this.unitOfWork.run((manager) => manager.update(Session, { userId: actor.userId!, endedAt: IsNull() }, { endedAt: this.clock.iso() }));
  }

  async me(actor: Actor): Promise<Me> {
    const user = await this.db.one<{ id: string; name: string; email: string; units: Preferences['units']; theme: Preferences['theme'] }>('SELECT id, name, email, units, theme FROM users WHERE id = ?', [actor.userId]);
    if (!user) throw new AppError('NOT_SIGNED_IN', 'Sign in to go on.');
    const profile = await this.shop.profile();
    return {
      id: user.id,
      name: user.name,
      email: user.email,
      roles: [...actor.roles],
      permissions: [...actor.permissions],
      customerId: actor.customerId,
      preferences: { units: user.units, theme: user.theme },
      shop: { name: profile.name, timeZone: this.config.timeZone, currency: profile.currency, demo: this.config.demo, mailboxUrl: this.config.mailboxUrl ?? null },
    };
  }

  async setPreferences(actor: Actor, preferences: Preferences): Promise<Me> {
    await this.unitOfWork.run((manager) => manager.update(User, { id: actor.userId! }, preferences));
    return this.me(actor);
  }

  /** The person's own password, typed at the moment of signing: tablets are shared. */
  async assertSigning(actor: Actor, password: string): Promise<void> {
    const user = await this.db.one<{ email: string; passwordHash: string }>('SELECT email, passwordHash FROM users WHERE id = ?', [actor.userId]);
    if (!user) throw new AppError('NOT_SIGNED_IN', 'Sign in to go on.');
    await this.brake.step(user.email, 'signing');
    if (await passwordMatches(user.passwordHash, password)) return this.brake.right(user.email, 'signing');
    throw new AppError('WRONG_SIGNATURE', 'That is not your password. Nothing was signed.', { fields: [{ path: 'password', code: 'wrong', message: 'That is not your password.' }] });
  }
}
