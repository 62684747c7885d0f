import { Inject, Injectable } from '@nestjs/common';
import type { CreateLoad } from '@shared/burnouts';
import type { EntityManager } from 'typeorm';
import { Clock } from '../clock/clock.js';
import { shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import type { QuerySource } from '../database/query-source.js';
import { AppError } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { ShopService } from '../shop/shop.service.js';
import { BurnoutLoadJob } from './burnout-load-job.entity.js';
import { loadProblems } from './load-input.js';
import { loadLimit, type PartLimit } from './load-limit.js';
import { PartsService } from './parts.service.js';

export interface LoadedJob {
  readonly jobId: string;
  readonly number: string;
  readonly ringsOff: boolean;
  readonly limit: PartLimit;
}
export interface Loading {
  readonly ovenName: string;
  readonly jobs: readonly LoadedJob[];
  readonly limit: PartLimit;
}

/** The jobs of a load with the limits their parts have at this moment. */
@Injectable()
export class LoadedJobsService {
  constructor(
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly shop: ShopService,
    private readonly parts: PartsService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  /** What is asked for, or a refusal at the fields that stand against it. */
  async checked(source: QuerySource, input: Pick<CreateLoad, 'ovenId' | 'day' | 'jobs'>, already: readonly LoadedJob[] = []): Promise<Loading> {
    const parts = await this.parts.ofJobs(source, input.jobs.map((j) => j.jobId));
    const { ovens } = await this.shop.bay();
    const fields = loadProblems(input, { parts, ovens, today: shopDate(this.clock.now(), this.config.timeZone), already: new Set(already.map((j) => j.jobId)) });
    if (fields.length > 0) throw new AppError('READINGS_NOT_VALID', 'The load cannot stand like this. Nothing was saved, and nothing you typed is lost.', { fields });
    const jobs = input.jobs.map(({ jobId, ringsOff }) => withLimit(parts.find((p) => p.jobId === jobId)!, ringsOff));
    return { ovenName: ovens.find((o) => o.id === input.ovenId)!.name, jobs, limit: loadLimit(jobs.map((j) => j.limit)) };
  }

  async inLoad(source: QuerySource, loadId: string): Promise<LoadedJob[]> {
    const rows = await source.query<{ jobId: string; ringsOff: number }[]>('SELECT jobId, ringsOff FROM burnout_load_jobs WHERE loadId = ? ORDER BY id', [loadId]);
    const parts = await this.parts.ofJobs(source, rows.map((r) => r.jobId));
    return rows.map(({ jobId, ringsOff }) => withLimit(parts.find((p) => p.jobId === jobId)!, ringsOff === 1));
  }

  async put(manager: EntityManager, loadId: string, jobs: readonly LoadedJob[]): Promise<void> {
    await manager.delete(BurnoutLoadJob, { loadId });
    for (const { jobId, ringsOff, limit } of jobs) {
      await manager.insert(BurnoutLoadJob, { id: this.ids.next(), loadId, jobId, ringsOff, limitC: limit.limitC, limitReason: limit.limitReason });
    }
  }
}

function withLimit({ jobId, number, limit }: { readonly jobId: string; readonly number: string; readonly limit: PartLimit | null }, ringsOff: boolean): LoadedJob {
  if (!limit) throw new Error(`Job ${number} is in a load without a dismantling record`);
  return { jobId, number, ringsOff, limit };
}
