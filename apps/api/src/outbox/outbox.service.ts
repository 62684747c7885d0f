import { Injectable } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import { Clock } from '../clock/clock.js';
import { Ids } from '../ids/ids.js';
import { OutboxItem } from './outbox-item.entity.js';

export interface MailPromise {
  readonly kind: string;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly jobId?: string | null;
  readonly customerId?: string | null;
  /** papers that go along, drawn when the mail leaves */
  readonly paperIds?: readonly string[];
  /** the same promise given twice leaves once */
  readonly dedupeKey?: string;
}

/** Promises to send something after the commit; written in the same unit as the change that causes it. */
@Injectable()
export class OutboxService {
  private readonly listeners = new Set<() => void>();

  constructor(
    private readonly clock: Clock,
    private readonly ids: Ids,
  ) {}

  async addMail(manager: EntityManager, mail: MailPromise): Promise<void> {
    if (mail.dedupeKey && (await manager.existsBy(OutboxItem, { dedupeKey: mail.dedupeKey }))) return;
    const now = this.clock.iso();
    await manager.insert(OutboxItem, {
      id: this.ids.next(),
      kind: `mail.${mail.kind}`,
      dedupeKey: mail.dedupeKey ?? null,
      payload: { text: mail.text, html: mail.html, paperIds: [...(mail.paperIds ?? [])] } as never,
      to: mail.to,
      subject: mail.subject,
      jobId: mail.jobId ?? null,
      customerId: mail.customerId ?? null,
      createdAt: now,
      availableAt: now,
      attempts: 0,
      sentAt: null,
      givenUpAt: null,
      lastError: null,
    });
    for (const listener of this.listeners) listener();
  }

  /** Wakes the worker when something was promised; it looks again after the commit. */
  onPromise(listener: () => void): void {
    this.listeners.add(listener);
  }
}
