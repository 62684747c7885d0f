import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** What leaves the house after the commit it was written in. */
@Entity('outbox')
@Index('outbox_waiting', ['sentAt', 'givenUpAt', 'availableAt'])
export class OutboxItem {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  kind: string;

  @Column({ type: 'text', nullable: true, unique: true })
  dedupeKey: string | null;

  @Column({ type: 'simple-json' })
  payload: Record<string, unknown>;

  @Column({ type: 'text' })
  to: string;

  @Column({ type: 'text' })
  subject: string;

  @Column({ type: 'text', nullable: true })
  jobId: string | null;

  @Column({ type: 'text', nullable: true })
  customerId: string | null;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'text' })
  availableAt: string;

  @Column({ type: 'integer' })
  attempts: number;

  @Column({ type: 'text', nullable: true })
  sentAt: string | null;

  @Column({ type: 'text', nullable: true })
  givenUpAt: string | null;

  @Column({ type: 'text', nullable: true })
  lastError: string | null;
}
