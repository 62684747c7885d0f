import { Inject, Injectable } from '@nestjs/common';
import { RUN_RULES } from '@libs/control-charts';
import type { AddOvenHistory, OvenChartQuery, OvenInsight, OvenList, WithdrawOvenHistory } from '@shared/insight';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import type { Oven } from '../shop/shop-profile.js';
import { ShopService } from '../shop/shop.service.js';
import { ovenChart } from './oven-chart.js';
import { OvenHistoryRow } from './oven-history.entity.js';
import { ovenSeries, type EntryRow, type StripRow } from './oven-series.js';

/**
 * Every strip in the oven with the first valid test after it, up to the next strip of that job. Records are compared by
 * their identifiers, which sort by the time they were made. The day is that of the last load before the strip
 * was written down, where there is one.
 */
const STRIPS = `SELECT s.id AS stripId, s.jobId, j.number, m.description AS machine, s.createdAt,
    (SELECT MAX(b.day) FROM burnout_load_jobs x JOIN burnout_loads b ON b.id = x.loadId WHERE x.jobId = s.jobId AND b.ovenId = json_extract(v.readings, '$.ovenId') AND b.day <= date(s.createdAt, '+1 day')) AS loadDay,
    t.id AS testId, t.increase AS "change",
    (SELECT MIN(r.id) FROM job_records r WHERE r.jobId = s.jobId AND r.kind = 'core-repair' AND r.id > s.id AND r.id < COALESCE(n.id, '~')) AS repairId,
    (SELECT COUNT(*) FROM job_records a WHERE a.jobId = s.jobId AND a.kind = 'core-test-after' AND a.id > s.id AND a.id < COALESCE(n.id, '~')) AS tests
  FROM job_records s JOIN record_revisions v ON v.recordId = s.id AND v.revision = s.revision JOIN jobs j ON j.id = s.jobId JOIN machines m ON m.id = j.machineId
  LEFT JOIN job_records n ON n.id = (SELECT MIN(l.id) FROM job_records l WHERE l.jobId = s.jobId AND l.kind = 'strip' AND l.id > s.id)
  LEFT JOIN job_records t ON t.id = (SELECT MIN(a.id) FROM job_records a WHERE a.jobId = s.jobId AND a.kind = 'core-test-after' AND a.id > s.id AND a.id < COALESCE(n.id, '~') AND a.verdict IN ('conforms', 'does-not-conform', 'inconclusive'))
  WHERE s.kind = 'strip' AND json_extract(v.readings, '$.method') = 'oven-burnout' AND json_extract(v.readings, '$.ovenId') = ? ORDER BY s.id`;
type StripAnswer = Omit<StripRow, 'day'> & { createdAt: string; loadDay: string | null };

/** Control charts of the ovens, from the shop's own jobs and from what its older book says. */
@Injectable()
export class InsightService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly shop: ShopService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async ovens(): Promise<OvenList> {
    return (await this.shop.bay()).ovens.map(({ id, name, remark }) => ({ id, name, remark }));
  }

  async oven(ovenId: string, query: OvenChartQuery): Promise<OvenInsight> {
    const { id, name, remark } = await this.known(ovenId);
    const rows = await this.db.all<StripAnswer>(STRIPS, [ovenId]);
    const entries = await this.db.all<EntryRow>('SELECT id, day, "change", remark, byName AS "by" FROM oven_history WHERE ovenId = ? AND withdrawnAt IS NULL ORDER BY day, id', [ovenId]);
    const strips = rows.map(({ createdAt, loadDay, ...row }) => ({ ...row, day: loadDay ?? shopDate(new Date(createdAt), this.config.timeZone) }));
    const { points, leftOut } = ovenSeries(strips, entries);
    const increaseLimit = await this.increaseLimit();
    return { oven: { id, name, remark }, increaseLimit, ...ovenChart(points, increaseLimit, query), leftOut, rules: RUN_RULES.map(({ rule, words, source, standing }) => ({ rule, words, source, standing })) };
  }

  async addHistory(actor: Actor, ovenId: string, { rows }: AddOvenHistory): Promise<OvenInsight> {
    const oven = await this.known(ovenId);
    const today = shopDate(this.clock.now(), this.config.timeZone);
    const fields = rows.flatMap(({ day }, i) => (day > today ? [{ path: `rows.${i}.day`, code: 'in-the-future', message: 'This day is still to come.' }] : []));
    if (fields.length > 0) throw new AppError('READINGS_NOT_VALID', 'Some figures cannot be right; see the fields. Nothing was saved.', { fields });
    await this.unitOfWork.run(async (manager) => {
      for (const { day, change, remark } of rows) {
        await manager.insert(OvenHistoryRow, { id: this.ids.next(), ovenId, day, change, remark, byUserId: actor.userId!, byName: actor.name, at: this.clock.iso(), withdrawnAt: null, withdrawnBecause: '' });
      }
      await this.history.record(manager, { actor, subject: { kind: 'oven', id: ovenId }, event: 'oven.history-entered', words: `${oven.name}: ${rows.length} earlier ${rows.length === 1 ? 'figure' : 'figures'} of core-loss change entered.`, data: { rows } });
    });
    return this.oven(ovenId, {});
  }

  /** A figure taken back stays in the table with its reason. */
  async withdraw(actor: Actor, entryId: string, { reason }: WithdrawOvenHistory): Promise<OvenInsight> {
    const ovenId = await this.unitOfWork.run(async (manager) => {
      const row = await manager.findOneBy(OvenHistoryRow, { id: entryId });
      if (!row) throw notFound('figure');
      if (row.withdrawnAt !== null) throw new AppError('ALREADY_DONE', 'This figure was taken back already.');
      await manager.update(OvenHistoryRow, { id: entryId }, { withdrawnAt: this.clock.iso(), withdrawnBecause: reason });
      await this.history.record(manager, { actor, subject: { kind: 'oven', id: row.ovenId }, event: 'oven.history-withdrawn', words: `A figure of ${row.day} taken back: ${reason}`, data: { id: entryId, day: row.day, change: row.change } });
      return row.ovenId;
    });
    return this.oven(ovenId, {});
  }

  private async known(ovenId: string): Promise<Oven> {
    const oven = (await this.shop.bay()).ovens.find((o) => o.id === ovenId);
    if (!oven) throw notFound('oven');
    return oven;
  }

  private async increaseLimit(): Promise<number> {
    const row = await this.db.one<{ increaseLimit: number }>(`SELECT json_extract("set", '$.core.increaseLimit') AS increaseLimit FROM limits_versions ORDER BY version DESC LIMIT 1`);
    if (!row) throw notFound('version of the limits');
    return row.increaseLimit;
  }
}
