import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import type { LoadReason, LoadVerdict, PartLimitReason } from '@shared/burnouts';
import { User } from '../users/user.entity.js';
import type { KeptRead } from './kept-read.js';

/** What stood in an oven together, and what its logger says of it. */
@Entity('burnout_loads')
@Index('burnout_loads_by_oven', ['ovenId', 'number'])
export class BurnoutLoad {
  @PrimaryColumn({ type: 'text' })
  id: string;

  /** counted through the shop, so that two loads of a day have different names */
  @Column({ type: 'integer', unique: true })
  number: number;

  @Column({ type: 'text' })
  ovenId: string;

  /** as it was called on the day */
  @Column({ type: 'text' })
  ovenName: string;

  @Column({ type: 'text' })
  day: string;

  @Column({ type: 'text' })
  remark: string;

  /** the lowest of its jobs' */
  @Column({ type: 'real' })
  limitC: number;

  @Column({ type: 'text' })
  limitReason: PartLimitReason;

  @Column({ type: 'text' })
  limitSource: string;

  @Column({ type: 'text' })
  limitStanding: string;

  @Column({ type: 'real' })
  offsetK: number;

  @Column({ type: 'simple-json', nullable: true })
  partChannels: string[] | null;

  @Column({ type: 'text', nullable: true })
  verdict: LoadVerdict | null;

  @Column({ type: 'simple-json' })
  reasons: LoadReason[];

  @Column({ type: 'text', nullable: true })
  hottest: string | null;

  @Column({ type: 'real', nullable: true })
  peakC: number | null;

  @Column({ type: 'real', nullable: true })
  minutesAboveLimit: number | null;

  @Column({ type: 'real', nullable: true })
  minutesAbove345C: number | null;

  @Column({ type: 'text', nullable: true })
  fileName: string | null;

  @Column({ type: 'text', nullable: true, unique: true })
  storedName: string | null;

  @Column({ type: 'integer', nullable: true })
  sizeBytes: number | null;

  @Column({ type: 'text', nullable: true })
  sha256: string | null;

  @Column({ type: 'text', nullable: true })
  readAt: string | null;

  /** how the file was told to be read, so that a correction reads it alike */
  @Column({ type: 'simple-json' })
  hints: { elapsedUnit?: 's' | 'min' | 'h'; dateOrder?: 'ymd' | 'dmy' | 'mdy'; unit?: 'C' | 'F' | 'K' };

  /** channels with their curves, problems: last, so that lists need not step over it */
  @Column({ type: 'simple-json', nullable: true })
  read: KeptRead | null;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  byUserId: string;

  @Column({ type: 'text' })
  byName: string;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'integer' })
  version: number;
}
