import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A request that was carried out under a key of its sender; the same request again gets the same answer. */
@Entity('idempotency_keys')
export class IdempotencyKey {
  @PrimaryColumn({ type: 'text' })
  actorId: string;

  @PrimaryColumn({ type: 'text' })
  key: string;

  @Column({ type: 'text' })
  requestHash: string;

  @Column({ type: 'text' })
  at: string;

  @Column({ type: 'integer', nullable: true })
  status: number | null;

  @Column({ type: 'text', nullable: true })
  body: string | null;
}
