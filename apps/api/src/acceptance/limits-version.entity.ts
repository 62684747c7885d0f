import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { LimitsSet } from '@shared/limits';

/** Acceptance limits as published; a job keeps the version it was received under. Append only. */
@Entity('limits_versions')
export class LimitsVersion {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer', unique: true })
  version: number;

  @Column({ type: 'simple-json' })
  set: LimitsSet;

  @Column({ type: 'text' })
  note: string;

  @Column({ type: 'text' })
  publishedAt: string;

  @Column({ type: 'text' })
  publishedByName: string;
}
