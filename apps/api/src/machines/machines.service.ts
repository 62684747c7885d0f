import { Injectable } from '@nestjs/common';
import type { CreateMachine, MachinePage, MachineQuery, MachineView, UpdateMachine } from '@shared/machines';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { Customer } from '../customers/customer.entity.js';
import type { QuerySource } from '../database/query-source.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { changedFields } from '../jobs/changed-fields.js';
import { contains } from '../search/like-pattern.js';
import { Machine } from './machine.entity.js';
import { toMachineView, visitsOf, type MachineRow } from './machine-view.js';

const SELECT = 'SELECT m.id, m.customerId, c.name AS customerName, m.description, m.nameplate, m.coreGeometry, m.version FROM machines m JOIN customers c ON c.id = m.customerId';

/** The machines, each with every visit it made. */
@Injectable()
export class MachinesService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
  ) {}

  async page({ page, size, customerId, q }: MachineQuery): Promise<MachinePage> {
    const where = [...(customerId ? ['m.customerId = ?'] : []), ...(q ? [`(m.serial LIKE ? ESCAPE '\\' OR m.description LIKE ? ESCAPE '\\')`] : [])];
    const sought = [...(customerId ? [customerId] : []), ...(q ? [contains(q), contains(q)] : [])];
    const filter = where.length > 0 ? `WHERE ${where.join(' AND ')}` : '';
    const total = await this.db.one<{ total: number }>(`SELECT COUNT(*) AS total FROM machines m ${filter}`, sought);
    const rows = await this.db.all<MachinePage['rows'][number]>(
      `SELECT m.id, m.customerId, c.name AS customerName, m.description, m.serial,
              (SELECT COUNT(*) FROM jobs j WHERE j.machineId = m.id) AS visits,
              (SELECT j.number FROM jobs j WHERE j.machineId = m.id ORDER BY j.id DESC LIMIT 1) AS lastJobNumber
       FROM machines m JOIN customers c ON c.id = m.customerId ${filter} ORDER BY m.description COLLATE NOCASE, m.id LIMIT ${size} OFFSET ${(page - 1) * size}`,
      sought,
    );
    return { rows, total: total?.total ?? 0, page, size };
  }

  one(id: string): Promise<MachineView> {
    return this.view(this.db, id);
  }

  create(actor: Actor, customerId: string, details: CreateMachine): Promise<MachineView> {
    return this.unitOfWork.run(async (manager) => {
      if (!(await manager.existsBy(Customer, { id: customerId }))) throw notFound('customer');
      const machine = await this.add(manager, actor, customerId, details);
      return this.view(manager, machine.id);
    });
  }

  /** Also part of booking in. The serial stands on its own beside the nameplate, to be found by. */
  async add(manager: EntityManager, actor: Actor, customerId: string, { description, nameplate }: CreateMachine): Promise<Machine> {
    const machine: Machine = { id: this.ids.next(), customerId, description, serial: nameplate.serial, nameplate, coreGeometry: null, createdAt: this.clock.iso(), version: 1 };
    await manager.insert(Machine, machine as never);
    await this.history.record(manager, { actor, subject: { kind: 'machine', id: machine.id }, event: 'machine.created', words: `Machine entered: ${description}.`, data: { customerId, serial: nameplate.serial } });
    return machine;
  }

  update(actor: Actor, id: string, { version, description, nameplate }: UpdateMachine): Promise<MachineView> {
    return this.unitOfWork.run(async (manager) => {
      const machine = await manager.findOneBy(Machine, { id });
      if (!machine) throw notFound('machine');
      if (machine.version !== version) throw changedMeanwhile('machine', await this.view(manager, id));
      const changed = changedFields<Pick<Machine, 'description'> & CreateMachine['nameplate']>({ description: machine.description, ...machine.nameplate }, { description, ...nameplate });
      if (changed) {
        await manager.update(Machine, { id }, { description, serial: nameplate.serial, nameplate: nameplate as never, version: machine.version + 1 });
        await this.history.record(manager, { actor, subject: { kind: 'machine', id }, event: 'machine.changed', words: `Nameplate or description changed: ${description}.`, data: { ...changed } });
      }
      return this.view(manager, id);
    });
  }

  private async view(source: QuerySource, id: string): Promise<MachineView> {
    const [row] = await source.query<MachineRow[]>(`${SELECT} WHERE m.id = ?`, [id]);
    if (!row) throw notFound('machine');
    return toMachineView(row, await visitsOf(source, id));
  }
}
