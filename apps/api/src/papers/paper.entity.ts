import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import { Job } from '../jobs/job.entity.js';
import { User } from '../users/user.entity.js';
import type { PaperKind } from '@shared/papers';

/** An issued paper: its model does not change, and prints to the same bytes again. */
@Entity('papers')
@Index('papers_by_job', ['jobId'])
@Index('papers_by_subject', ['subjectId', 'kind'])
export class Paper {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  kind: PaperKind;

  @Column({ type: 'text' })
  number: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Job)
  jobId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'text' })
  subjectId: string;

  @Column({ type: 'text' })
  issuedAt: string;

  @Column({ type: 'simple-json' })
  model: unknown;

  @Column({ type: 'text' })
  templateVersion: string;

  @Column({ type: 'text', nullable: true })
  sha256: string | null;

  @Column({ type: 'text', nullable: true, unique: true })
  verificationCode: string | null;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => Paper)
  supersededById: string | null;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => User)
  issuedByUserId: string | null;

  @Column({ type: 'integer' })
  version: number;
}
