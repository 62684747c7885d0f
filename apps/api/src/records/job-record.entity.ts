import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Job } from '../jobs/job.entity.js';
import { Machine } from '../machines/machine.entity.js';
import type { RecordKind } from '@shared/records';

/** A record of a job: its readings and result stand in its revisions, the newest figures here for lists. */
@Entity('job_records')
@Index('job_records_in_order', ['jobId', 'kind', 'ordinal'], { unique: true })
@Index('job_records_by_machine', ['machineId', 'kind'])
export class JobRecord {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Job)
  jobId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Machine)
  machineId: string;

  @Column({ type: 'text' })
  kind: RecordKind;

  @Column({ type: 'integer' })
  ordinal: number;

  @Column({ type: 'integer' })
  revision: number;

  @Column({ type: 'text', nullable: true })
  verdict: string | null;

  @Column({ type: 'real', nullable: true })
  wattsPerKg: number | null;

  @Column({ type: 'real', nullable: true })
  increase: number | null;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'integer' })
  version: number;
}
