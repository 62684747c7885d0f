import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import { Invoice } from '../invoices/invoice.entity.js';
import { User } from '../users/user.entity.js';

/** Money that came in. Append only; one row a payment intent. */
@Entity('payments')
@Index('payments_by_invoice', ['invoiceId'])
export class Payment {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Invoice)
  invoiceId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'text' })
  kind: 'card' | 'bank-transfer' | 'cash';

  @Column({ type: 'integer' })
  amountMinor: number;

  @Column({ type: 'text' })
  currency: string;

  @Column({ type: 'text' })
  receivedAt: string;

  @Column({ type: 'text' })
  reference: string;

  @Column({ type: 'text', nullable: true, unique: true })
  paymentIntentId: string | null;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => User)
  recordedByUserId: string | null;

  @Column({ type: 'text' })
  recordedByName: string;

  @Column({ type: 'text' })
  createdAt: string;
}
