import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import { Invoice } from '../invoices/invoice.entity.js';

/** One way to the payment page; the idempotency key of the payment service is made from it. */
@Entity('checkout_attempts')
@Index('checkout_attempts_in_order', ['invoiceId', 'attempt'], { unique: true })
export class CheckoutAttempt {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Invoice)
  invoiceId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'integer' })
  attempt: number;

  @Column({ type: 'integer' })
  amountMinor: number;

  @Column({ type: 'text' })
  currency: string;

  @Column({ type: 'text', nullable: true, unique: true })
  sessionId: string | null;

  @Column({ type: 'text', nullable: true })
  url: string | null;

  @Column({ type: 'text' })
  state: 'asked' | 'open' | 'complete' | 'expired';

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'integer' })
  version: number;
}
