import { Column, Entity, PrimaryColumn } from 'typeorm';

/** Events of the payment service that were taken; an event that comes again finds its row here. */
@Entity('payment_events')
export class PaymentEvent {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  type: string;

  @Column({ type: 'text' })
  objectId: string;

  @Column({ type: 'text' })
  receivedAt: string;

  @Column({ type: 'text' })
  outcome: string;
}
