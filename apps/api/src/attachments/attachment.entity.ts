import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import { Job } from '../jobs/job.entity.js';
import { JobRecord } from '../records/job-record.entity.js';
import { User } from '../users/user.entity.js';

@Entity('attachments')
@Index('attachments_by_job', ['jobId'])
export class Attachment {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Job)
  jobId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => JobRecord)
  recordId: string | null;

  @Column({ type: 'text' })
  name: string;

  @Column({ type: 'text' })
  mime: string;

  @Column({ type: 'text', unique: true })
  storedName: string;

  @Column({ type: 'integer' })
  sizeBytes: number;

  @Column({ type: 'text' })
  sha256: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  addedByUserId: string;

  @Column({ type: 'text' })
  addedByName: string;

  @Column({ type: 'text' })
  addedAt: string;
}
