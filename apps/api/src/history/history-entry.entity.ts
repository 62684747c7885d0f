import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** Who changed what, from what, to what. Append only, chained by hash. */
@Entity('history')
@Index('history_by_job', ['jobId', 'seq'])
@Index('history_by_subject', ['subjectId', 'seq'])
export class HistoryEntry {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer', unique: true })
  seq: number;

  @Column({ type: 'text' })
  at: string;

  @Column({ type: 'text', nullable: true })
  actorId: string | null;

  @Column({ type: 'text' })
  actorName: string;

  @Column({ type: 'text' })
  subjectKind: string;

  @Column({ type: 'text' })
  subjectId: string;

  @Column({ type: 'text', nullable: true })
  jobId: string | null;

  @Column({ type: 'text' })
  event: string;

  @Column({ type: 'text' })
  words: string;

  @Column({ type: 'simple-json' })
  data: Record<string, unknown>;

  @Column({ type: 'text' })
  previousHash: string;

  @Column({ type: 'text' })
  hash: string;
}
