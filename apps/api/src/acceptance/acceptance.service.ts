import { Injectable, type OnModuleInit } from '@nestjs/common';
import type { LimitsSet, LimitsVersionView } from '@shared/limits';
import type { EntityManager } from 'typeorm';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { DEFAULT_LIMITS } from './default-limits.js';
import { LimitsVersion } from './limits-version.entity.js';

interface Row {
  version: number;
  set: string;
  note: string;
  publishedAt: string;
  publishedByName: string;
}
const toView = (row: Row): LimitsVersionView => ({ version: row.version, publishedAt: row.publishedAt, publishedBy: row.publishedByName, note: row.note, set: JSON.parse(row.set) as Record<string, unknown> });

/** Acceptance limits by version; a job is judged by the version it was received under. */
@Injectable()
export class AcceptanceService implements OnModuleInit {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
  ) {}

  /** A shop without limits starts with the shipped ones, said to be unconfirmed. */
  async onModuleInit(): Promise<void> {
    await this.unitOfWork.run(async (manager) => {
      if (await manager.exists(LimitsVersion)) return;
      await manager.insert(LimitsVersion, { id: this.ids.next(), version: 1, set: DEFAULT_LIMITS as never, note: 'Limits as shipped, to be confirmed by the shop’s engineer.', publishedAt: this.clock.iso(), publishedByName: 'Loopbay' });
    });
  }

  async versions(): Promise<LimitsVersionView[]> {
    return (await this.db.all<Row>('SELECT version, "set", note, publishedAt, publishedByName FROM limits_versions ORDER BY version DESC')).map(toView);
  }

  async version(version: number): Promise<LimitsVersionView> {
    const row = await this.db.one<Row>('SELECT version, "set", note, publishedAt, publishedByName FROM limits_versions WHERE version = ?', [version]);
    if (!row) throw notFound('version of the limits');
    return toView(row);
  }

  async setOf(manager: EntityManager, version: number): Promise<LimitsSet> {
    const row = await manager.findOneBy(LimitsVersion, { version });
    if (!row) throw notFound('version of the limits');
    return row.set;
  }
}
