import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { User } from '../users/user.entity.js';

/** What an older book says of an oven; taken back with a reason, never changed. */
@Entity('oven_history')
@Index('oven_history_in_order', ['ovenId', 'day', 'id'])
export class OvenHistoryRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  ovenId: string;

  @Column({ type: 'text' })
  day: string;

  @Column({ type: 'real' })
  change: number;

  @Column({ type: 'text' })
  remark: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  byUserId: string;

  @Column({ type: 'text' })
  byName: string;

  @Column({ type: 'text' })
  at: string;

  @Column({ type: 'text', nullable: true })
  withdrawnAt: string | null;

  @Column({ type: 'text' })
  withdrawnBecause: string;
}
