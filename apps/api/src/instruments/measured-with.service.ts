import { Inject, Injectable } from '@nestjs/common';
import type { MeasuredPage, MeasuredQuery, MeasuredRow } from '@shared/calibrations';
import { dayEnd, dayStart } from '../clock/day-start.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { notFound } from '../http/app-error.js';

type Row = Omit<MeasuredRow, 'superseded' | 'overdueThen'> & { superseded: number; overdueThen: number };

/** Of each record the last revision made with the instrument; the columns beside MAX come from that very row (SQLite). */
const USED = `SELECT v.recordId, MAX(v.revision) AS revision, json_extract(i.value, '$.dueOn') AS dueOnThen, json_extract(i.value, '$.overdueOnTheDay') AS overdueThen
  FROM record_revisions v, json_each(v.instruments) i WHERE json_extract(i.value, '$.id') = ? GROUP BY v.recordId`;
const JOINED = `FROM (${USED}) u
  JOIN record_revisions v ON v.recordId = u.recordId AND v.revision = u.revision
  JOIN job_records r ON r.id = u.recordId
  JOIN jobs j ON j.id = r.jobId
  JOIN machines m ON m.id = r.machineId
  JOIN customers c ON c.id = j.customerId`;

/** What was measured with an instrument: for looking up, and for whom to tell when it was found to read wrong. */
@Injectable()
export class MeasuredWithService {
  constructor(
    private readonly db: ReadDb,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  /** By the day a record was made: a later correction of it does not make the measurement any younger. */
  async page(instrumentId: string, { page, size, from, to }: MeasuredQuery): Promise<MeasuredPage> {
    if (!(await this.db.one('SELECT id FROM instruments WHERE id = ?', [instrumentId]))) throw notFound('instrument');
    const begin = from === undefined ? null : dayStart(from, this.config.timeZone);
    const end = to === undefined ? null : dayEnd(to, this.config.timeZone);
    const where = [...(begin ? ['r.createdAt >= ?'] : []), ...(end ? ['r.createdAt < ?'] : [])];
    const given = [instrumentId, ...(begin ? [begin] : []), ...(end ? [end] : [])];
    const filtered = `${JOINED}${where.length > 0 ? ` WHERE ${where.join(' AND ')}` : ''}`;
    const counted = await this.db.one<{ total: number }>(`SELECT COUNT(*) AS total ${filtered}`, given);
    const rows = await this.db.all<Row>(
      `SELECT r.id AS recordId, r.kind, r.ordinal, u.revision, (u.revision < r.revision) AS superseded, v.verdict, r.createdAt AS at, v.byName AS "by",
         j.id AS jobId, j.number AS jobNumber, j.state AS jobState, c.name AS customerName, m.description AS machine,
         (SELECT p.number FROM papers p WHERE p.jobId = j.id AND p.kind = 'certificate' AND p.supersededById IS NULL ORDER BY p.issuedAt DESC LIMIT 1) AS certificateNumber,
         u.dueOnThen, u.overdueThen
       ${filtered} ORDER BY r.createdAt DESC, r.id DESC LIMIT ? OFFSET ?`,
      [...given, size, (page - 1) * size],
    );
    return { rows: rows.map((row) => ({ ...row, superseded: row.superseded === 1, overdueThen: row.overdueThen === 1 })), total: counted?.total ?? 0, page, size };
  }
}
