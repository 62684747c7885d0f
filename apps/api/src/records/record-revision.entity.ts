import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { JobRecord } from './job-record.entity.js';
import { User } from '../users/user.entity.js';
import type { Entered } from '@shared/fields';

/** What was read and what followed from it, as it stood; a correction is the next revision. Append only. */
@Entity('record_revisions')
@Index('record_revisions_in_order', ['recordId', 'revision'], { unique: true })
export class RecordRevision {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => JobRecord)
  recordId: string;

  @Column({ type: 'integer' })
  revision: number;

  @Column({ type: 'simple-json' })
  readings: unknown;

  @Column({ type: 'simple-json' })
  entered: Entered;

  @Column({ type: 'simple-json' })
  result: unknown;

  @Column({ type: 'text', nullable: true })
  verdict: string | null;

  @Column({ type: 'text' })
  calculation: string;

  @Column({ type: 'integer' })
  limitsVersion: number;

  @Column({ type: 'simple-json' })
  instruments: unknown;

  @Column({ type: 'text' })
  reason: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  byUserId: string;

  @Column({ type: 'text' })
  byName: string;

  @Column({ type: 'text' })
  at: string;

  @Column({ type: 'text' })
  contentHash: string;
}
