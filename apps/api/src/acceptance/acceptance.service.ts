import { Injectable, type OnModuleInit } from '@nestjs/common';
import { differenceWords, limitDifferences, sourcesToLookAt, type LimitDifference } from '@shared/limit-differences';
import { asKept, type LimitsComparison, type LimitsSet, type LimitsVersionView, type PublishLimits } from '@shared/limits';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
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
    private readonly history: HistoryService,
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

  async compare(from: number, to: number): Promise<LimitsComparison> {
    const [a, b] = [await this.version(from), await this.version(to)];
    return { from, to, differences: limitDifferences(a.set, b.set) };
  }

  /** The next version, built on the one in force. Jobs keep the version they were received under. */
  async publish(actor: Actor, { baseVersion, note, set, confirmedSources }: PublishLimits): Promise<LimitsVersionView> {
    const version = await this.unitOfWork.run(async (manager) => {
      const [row] = await manager.query<Row[]>('SELECT version, "set", note, publishedAt, publishedByName FROM limits_versions ORDER BY version DESC LIMIT 1');
      const inForce = toView(row!);
      if (inForce.version !== baseVersion) throw changedMeanwhile('set of limits', inForce);
      const kept = asKept(set);
      const differences = limitDifferences(inForce.set, kept);
      if (differences.length === 0) throw new AppError('ALREADY_DONE', `Nothing differs from version ${inForce.version}: there is nothing to publish.`);
      assertSourcesLookedAt(sourcesToLookAt(inForce.set, kept, confirmedSources));
      const next = { id: this.ids.next(), version: inForce.version + 1, set: kept as never, note, publishedAt: this.clock.iso(), publishedByName: actor.name };
      await manager.insert(LimitsVersion, next);
      await this.history.record(manager, {
        actor,
        subject: { kind: 'limits', id: next.id },
        event: 'limits.published',
        words: `Acceptance limits no. ${next.version} published: ${inShort(differences)} (${note})`,
        data: { from: inForce.version, to: next.version, note, confirmedSources, differences: differences.map(({ path, from, to }) => ({ path, from, to })) },
      });
      return next.version;
    });
    return this.version(version);
  }

  async setOf(manager: EntityManager, version: number): Promise<LimitsSet> {
    const row = await manager.findOneBy(LimitsVersion, { version });
    if (!row) throw notFound('version of the limits');
    return row.set;
  }
}

const inShort = (differences: readonly LimitDifference[]): string => {
  const first = differences.slice(0, 3).map(differenceWords).join('; ');
  return differences.length > 3 ? `${first}; and ${differences.length - 3} more` : first;
};

/** A figure that changed under an old source may say of a standard what it does not say. */
function assertSourcesLookedAt(open: readonly string[]): void {
  if (open.length === 0) return;
  const message = 'The figure changed: write where the new one comes from, or say that this still stands.';
  throw new AppError('INPUT_NOT_VALID', 'Some changed limits still carry the source of the old figure; see the fields.', { fields: open.map((path) => ({ path: `set.${path}.source`, code: 'source-not-looked-at', message })) });
}
