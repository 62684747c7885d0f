import { Injectable } from '@nestjs/common';
import type { z } from 'zod';
import type { outboxListSchema } from '@shared/messages';
import { ReadDb } from '../database/read-db.js';

type OutboxList = z.infer<typeof outboxListSchema>;

/** What was sent or waits to be sent, for a person to read. */
@Injectable()
export class MessagesService {
  constructor(private readonly db: ReadDb) {}

  latest(jobId: string | null): Promise<OutboxList> {
    return this.db.all<OutboxList[number]>(
      `SELECT id, kind, "to", subject, attempts, createdAt, sentAt, lastError,
              CASE WHEN sentAt IS NOT NULL THEN 'sent' WHEN givenUpAt IS NOT NULL THEN 'given-up' ELSE 'waiting' END AS state
       FROM outbox WHERE (:jobId IS NULL OR jobId = :jobId) ORDER BY id DESC LIMIT 200`,
      [{ jobId }],
    );
  }
}
