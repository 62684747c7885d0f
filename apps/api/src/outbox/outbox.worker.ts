import { AsyncResource } from 'node:async_hooks';
import { Injectable, Logger, type OnApplicationBootstrap, type OnApplicationShutdown } from '@nestjs/common';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { PapersService } from '../papers/papers.service.js';
import { Mailer } from './mailer.js';
import { OutboxItem } from './outbox-item.entity.js';
import { nextTry } from './outbox-schedule.js';
import { OutboxService } from './outbox.service.js';

interface Waiting {
  id: string;
  kind: string;
  to: string;
  subject: string;
  payload: string;
  attempts: number;
  createdAt: string;
}

/** Keeps the outbox's promises: after the commit, one at a time, again later when the mail server does not answer. */
@Injectable()
export class OutboxWorker implements OnApplicationBootstrap, OnApplicationShutdown {
  private readonly log = new Logger('Outbox');
  private timer: NodeJS.Timeout | undefined;
  private running: Promise<number> | undefined;
  private stopped = false;

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly mailer: Mailer,
    private readonly papers: PapersService,
    outbox: OutboxService,
  ) {
    // a promise is given inside a unit of work; the worker that keeps it must not inherit that unit
    outbox.onPromise(AsyncResource.bind(() => this.soon(50)));
  }

  onApplicationBootstrap(): void {
    this.soon(200);
  }

  async onApplicationShutdown(): Promise<void> {
    this.stopped = true;
    clearTimeout(this.timer);
    await this.running?.catch(() => undefined);
    this.mailer.close();
  }

  private soon(ms: number): void {
    if (this.stopped) return;
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.drain().catch((e: unknown) => this.log.error(e)).finally(() => this.soon(2_000)), ms);
    this.timer.unref();
  }

  /** Sends what is due; answers how many left. A drain that is running already is waited for. */
  async drain(): Promise<number> {
    this.running ??= this.drainOnce().finally(() => (this.running = undefined));
    return this.running;
  }

  private async drainOnce(): Promise<number> {
    const due = await this.db.all<Waiting>(
      'SELECT id, kind, "to", subject, payload, attempts, createdAt FROM outbox WHERE sentAt IS NULL AND givenUpAt IS NULL AND availableAt <= ? ORDER BY id LIMIT 50',
      [this.clock.iso()],
    );
    let sent = 0;
    for (const item of due) {
      if (this.stopped) break;
      if (await this.keep(item)) sent += 1;
    }
    return sent;
  }

  private async keep(item: Waiting): Promise<boolean> {
    try {
      const payload = JSON.parse(item.payload) as { text: string; html: string; paperIds?: string[] };
      const attachments = await this.papers.asAttachments(payload.paperIds ?? []);
      await this.mailer.send({ to: item.to, subject: item.subject, text: payload.text, html: payload.html, messageId: `<${item.id}@loopbay.invalid>`, attachments });
      await this.unitOfWork.run((manager) => manager.update(OutboxItem, { id: item.id }, { sentAt: this.clock.iso(), attempts: item.attempts + 1, lastError: null }));
      return true;
    } catch (error) {
      await this.postpone(item, error);
      return false;
    }
  }

  private async postpone(item: Waiting, error: unknown): Promise<void> {
    const words = (error instanceof Error ? error.message : String(error)).slice(0, 300);
    const next = nextTry(item.attempts + 1, new Date(item.createdAt), this.clock.now());
    this.log.warn(`${item.kind} did not leave: ${words}`);
    await this.unitOfWork.run((manager) =>
      manager.update(OutboxItem, { id: item.id }, {
        attempts: item.attempts + 1,
        lastError: words,
        ...(next.giveUp ? { givenUpAt: this.clock.iso() } : { availableAt: next.at.toISOString() }),
      }),
    );
  }
}
