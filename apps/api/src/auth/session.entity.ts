import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { User } from '../users/user.entity.js';

/** A sign-in that lives until signed out, expired, or its user is disabled. */
@Entity('sessions')
@Index('sessions_by_user', ['userId'])
export class Session {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  userId: string;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'text' })
  lastSeenAt: string;

  @Column({ type: 'text' })
  expiresAt: string;

  @Column({ type: 'text', nullable: true })
  endedAt: string | null;
}
