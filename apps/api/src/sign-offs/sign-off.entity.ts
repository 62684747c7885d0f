import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Job } from '../jobs/job.entity.js';
import { JobRecord } from '../records/job-record.entity.js';
import { User } from '../users/user.entity.js';
import type { SIGN_OFF_KINDS } from '@shared/waivers';

export type SignOffKind = (typeof SIGN_OFF_KINDS)[number];

/** A signature: who, when, what was signed and its content hash. Append only. */
@Entity('sign_offs')
@Index('sign_offs_by_job', ['jobId', 'kind'])
export class SignOff {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Job)
  jobId: string;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => JobRecord)
  recordId: string | null;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => SignOff)
  refersTo: string | null;

  @Column({ type: 'text' })
  kind: SignOffKind;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  byUserId: string;

  @Column({ type: 'text' })
  byName: string;

  @Column({ type: 'text' })
  byRoles: string;

  @Column({ type: 'text' })
  at: string;

  @Column({ type: 'text' })
  reason: string;

  @Column({ type: 'simple-json' })
  detail: Record<string, unknown>;

  @Column({ type: 'text' })
  contentHash: string;

  @Column({ type: 'integer' })
  version: number;
}
