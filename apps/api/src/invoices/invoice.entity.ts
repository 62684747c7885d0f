import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import { Job } from '../jobs/job.entity.js';
import { Paper } from '../papers/paper.entity.js';
import { Quote } from '../quotes/quote.entity.js';
import { User } from '../users/user.entity.js';

/** Issued, it does not change; what it owes follows from its payments. */
@Entity('invoices')
@Index('invoices_by_job', ['jobId'])
@Index('invoices_by_customer', ['customerId'])
@Index('invoices_by_due', ['dueOn'])
@Index('one_invoice_a_quote', ['quoteId'], { unique: true })
export class Invoice {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text', unique: true })
  number: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Job)
  jobId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Quote)
  quoteId: string;

  @Column({ type: 'text' })
  currency: string;

  @Column({ type: 'integer' })
  netMinor: number;

  @Column({ type: 'integer' })
  taxMinor: number;

  @Column({ type: 'integer' })
  grossMinor: number;

  @Column({ type: 'text' })
  issuedAt: string;

  @Column({ type: 'text' })
  issuedOn: string;

  @Column({ type: 'text' })
  dueOn: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  issuedByUserId: string;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => Paper)
  paperId: string | null;

  @Column({ type: 'integer' })
  version: number;
}
