import { Injectable } from '@nestjs/common';
import type { JobLoad, LoadListQuery, LoadPage, LoadView, WaitingJob } from '@shared/burnouts';
import type { QuerySource } from '../database/query-source.js';
import { ReadDb } from '../database/read-db.js';
import { notFound } from '../http/app-error.js';
import { FIGURES, HEAD_SELECT, JOBS_COLUMN, LOAD_JOBS_SELECT, toJobLoad, toLoadRow, toLoadView, type HeadRow, type ListRow, type LoadJobRow, type OfJobRow } from './load-view.js';
import { PartsService } from './parts.service.js';

/** Burnout loads as they stand: all, one, those of a job, and who waits before the oven. */
@Injectable()
export class LoadReadService {
  constructor(
    private readonly db: ReadDb,
    private readonly parts: PartsService,
  ) {}

  async page({ ovenId, page, size }: LoadListQuery): Promise<LoadPage> {
    const [where, values] = ovenId ? ['WHERE b.ovenId = ?', [ovenId]] : ['', []];
    const counted = await this.db.one<{ total: number }>(`SELECT COUNT(*) AS total FROM burnout_loads b ${where}`, values);
    const rows = await this.db.all<ListRow>(`SELECT ${FIGURES}, ${JOBS_COLUMN} FROM burnout_loads b ${where} ORDER BY b.number DESC LIMIT ? OFFSET ?`, [...values, size, (page - 1) * size]);
    return { rows: rows.map(toLoadRow), total: counted?.total ?? 0, page, size };
  }

  async one(id: string, source: QuerySource = this.db): Promise<LoadView> {
    const [head] = await source.query<HeadRow[]>(HEAD_SELECT, [id]);
    if (!head) throw notFound('load');
    const jobs = await source.query<LoadJobRow[]>(LOAD_JOBS_SELECT, [id]);
    return toLoadView(head, jobs, await this.parts.ofJobs(source, jobs.map((j) => j.jobId)));
  }

  async ofJob(jobId: string): Promise<JobLoad[]> {
    if (!(await this.db.one('SELECT id FROM jobs WHERE id = ?', [jobId]))) throw notFound('job');
    const rows = await this.db.all<OfJobRow>(
      `SELECT ${FIGURES}, x.limitC AS ownLimitC, x.limitReason AS ownReason, (SELECT COUNT(*) - 1 FROM burnout_load_jobs o WHERE o.loadId = b.id) AS others
       FROM burnout_load_jobs x JOIN burnout_loads b ON b.id = x.loadId WHERE x.jobId = ? ORDER BY b.number DESC`,
      [jobId],
    );
    return rows.map(toJobLoad);
  }

  async waiting(): Promise<WaitingJob[]> {
    const parts = await this.parts.beforeTheOven(this.db);
    return parts.map(({ jobId, number, machine, customer, step, state, limit, rings, loads }) => ({
      jobId,
      number,
      machine,
      customer,
      step,
      onHold: state === 'on-hold',
      own: limit && { limitC: limit.limitC, limitReason: limit.limitReason },
      rings,
      loads: [...loads],
    }));
  }
}
