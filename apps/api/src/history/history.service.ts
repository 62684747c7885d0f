import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import type { HistoryEntryView } from '@shared/jobs';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { Ids } from '../ids/ids.js';
import { HistoryEntry } from './history-entry.entity.js';

export interface HistoryEvent {
  readonly actor: Actor;
  readonly subject: { readonly kind: string; readonly id: string };
  readonly jobId?: string | null;
  /** past tense, dotted: 'job.moved', 'quote.approved' */
  readonly event: string;
  readonly words: string;
  readonly data?: Record<string, unknown>;
}

/** Who changed what, written in the same unit as the change, append only, chained by hash. */
@Injectable()
export class HistoryService {
  constructor(
    private readonly db: ReadDb,
    private readonly clock: Clock,
    private readonly ids: Ids,
  ) {}

  async record(manager: EntityManager, event: HistoryEvent): Promise<void> {
    const [last] = await manager.query<{ seq: number; hash: string }[]>('SELECT seq, hash FROM history ORDER BY seq DESC LIMIT 1');
    const content = {
      id: this.ids.next(),
      seq: (last?.seq ?? 0) + 1,
      at: this.clock.iso(),
      actorId: event.actor.userId,
      actorName: event.actor.name,
      subjectKind: event.subject.kind,
      subjectId: event.subject.id,
      jobId: event.jobId ?? null,
      event: event.event,
      words: event.words,
      data: event.data ?? {},
      previousHash: last?.hash ?? '',
    };
    await manager.insert(HistoryEntry, { ...content, hash: entryHash(content) } as never);
  }

  async ofJob(jobId: string): Promise<HistoryEntryView[]> {
    const rows = await this.db.all<{ id: string; at: string; actorName: string; event: string; words: string; data: string }>(
      'SELECT id, at, actorName, event, words, data FROM history WHERE jobId = ? ORDER BY seq DESC LIMIT 500',
      [jobId],
    );
    return rows.map((r) => ({ id: r.id, at: r.at, who: r.actorName, event: r.event, words: r.words, data: JSON.parse(r.data) as Record<string, unknown> }));
  }

  /** The first entry that does not follow from the one before it, or null when the chain is whole. */
  async firstBreak(): Promise<number | null> {
    let previous = '';
    for (let seq = 0; ; ) {
      const page = await this.db.all<Record<string, string | number | null> & { seq: number; hash: string }>('SELECT * FROM history WHERE seq > ? ORDER BY seq LIMIT 1000', [seq]);
      if (page.length === 0) return null;
      for (const row of page) {
        const { hash, ...content } = row;
        const expected = entryHash({ ...content, data: JSON.parse(String(row['data'])) });
        if (content['previousHash'] !== previous || hash !== expected || row.seq !== seq + 1) return row.seq;
        previous = hash;
        seq = row.seq;
      }
    }
  }
}

/** Keys in a fixed order, so that the same entry always hashes the same. */
function entryHash(content: Record<string, unknown>): string {
  const ordered = Object.fromEntries(Object.entries(content).sort(([a], [b]) => (a < b ? -1 : 1)));
  return createHash('sha256').update(JSON.stringify(ordered)).digest('hex');
}
