import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import type { PartLimitReason } from '@shared/burnouts';
import { Job } from '../jobs/job.entity.js';
import { BurnoutLoad } from './burnout-load.entity.js';

/** A job in a load, with the limit its part had when the load was judged. */
@Entity('burnout_load_jobs')
@Index('burnout_load_jobs_once', ['loadId', 'jobId'], { unique: true })
@Index('burnout_load_jobs_by_job', ['jobId'])
export class BurnoutLoadJob {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => BurnoutLoad)
  loadId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Job)
  jobId: string;

  @Column({ type: 'boolean' })
  ringsOff: boolean;

  @Column({ type: 'real' })
  limitC: number;

  @Column({ type: 'text' })
  limitReason: PartLimitReason;
}
