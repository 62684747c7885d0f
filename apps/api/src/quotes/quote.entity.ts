import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import { Job } from '../jobs/job.entity.js';
import { User } from '../users/user.entity.js';
import type { QuoteState } from '@shared/quotes';

@Entity('quotes')
@Index('quotes_in_order', ['number', 'revision'], { unique: true })
@Index('quotes_by_job', ['jobId'])
@Index('quotes_by_customer', ['customerId', 'state'])
export class Quote {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Job)
  jobId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'text' })
  number: string;

  @Column({ type: 'integer' })
  revision: number;

  @Column({ type: 'text' })
  state: QuoteState;

  @Column({ type: 'text' })
  currency: string;

  @Column({ type: 'integer' })
  netMinor: number;

  @Column({ type: 'integer' })
  taxMinor: number;

  @Column({ type: 'integer' })
  grossMinor: number;

  @Column({ type: 'text' })
  validUntil: string;

  @Column({ type: 'text' })
  note: string;

  @Column({ type: 'text', nullable: true })
  sentAt: string | null;

  @Column({ type: 'text', nullable: true })
  approvedHow: 'portal' | 'phone' | 'purchase-order' | null;

  @Column({ type: 'text', nullable: true })
  approvedBy: string | null;

  @Column({ type: 'text', nullable: true })
  approvedAt: string | null;

  @Column({ type: 'text' })
  purchaseOrder: string;

  @Column({ type: 'integer', nullable: true })
  notToExceedMinor: number | null;

  @Column({ type: 'text', nullable: true })
  declineReason: string | null;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  createdByUserId: string;

  @Column({ type: 'integer' })
  version: number;
}
