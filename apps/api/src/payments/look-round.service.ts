import { Injectable, Logger, type OnApplicationBootstrap, type OnApplicationShutdown } from '@nestjs/common';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { CheckoutService } from './checkout.service.js';
import { PaymentService } from './payment-service.js';
import { SettleService } from './settle.service.js';

const EVERY_MS = 60_000;
/** Younger ones are still being asked for, or their event is on its way. */
const OLDER_THAN_MS = 60_000;
/** A page lives a day at the service; what was asked for two days ago and is nowhere was never made. */
const NEVER_MADE_AFTER_MS = 48 * 3_600_000;

interface OpenAttempt {
  id: string;
  invoiceId: string;
  sessionId: string | null;
  createdAt: string;
}

/** Once a minute every payment page that is open on our side is looked up: a lost event delays money, it never loses it. */
@Injectable()
export class LookRoundService implements OnApplicationBootstrap, OnApplicationShutdown {
  private readonly log = new Logger('Payments');
  private timer: NodeJS.Timeout | undefined;
  private running: Promise<number> | undefined;
  private stopped = false;

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly service: PaymentService,
    private readonly settlements: SettleService,
    private readonly checkout: CheckoutService,
  ) {}

  onApplicationBootstrap(): void {
    this.next(0);
  }

  async onApplicationShutdown(): Promise<void> {
    this.stopped = true;
    clearTimeout(this.timer);
    await this.running?.catch(() => undefined);
  }

  /** Looks up what is open; answers how many attempts were looked at. A round that is running already is waited for. */
  reconcile(): Promise<number> {
    this.running ??= this.round().finally(() => (this.running = undefined));
    return this.running;
  }

  private next(ms: number): void {
    if (this.stopped) return;
    this.timer = setTimeout(() => void this.reconcile().catch((error: unknown) => this.log.warn(`The payment service was not reached: ${error instanceof Error ? error.message : String(error)}`)).finally(() => this.next(EVERY_MS)), ms);
    this.timer.unref();
  }

  private async round(): Promise<number> {
    const before = new Date(this.clock.now().getTime() - OLDER_THAN_MS).toISOString();
    const open = await this.db.all<OpenAttempt>("SELECT id, invoiceId, sessionId, createdAt FROM checkout_attempts WHERE state IN ('asked', 'open') AND createdAt < ? ORDER BY id LIMIT 500", [before]);
    let looked = 0;
    for (const attempt of open) {
      if (this.stopped) break;
      await this.lookAt(attempt);
      looked += 1;
    }
    return looked;
  }

  private async lookAt(attempt: OpenAttempt): Promise<void> {
    const session = attempt.sessionId ? await this.service.session(attempt.sessionId) : await this.service.sessionOfAttempt(attempt.id);
    if (session) {
      await this.unitOfWork.run((manager) => this.settlements.settle(manager, session));
      await this.checkout.closeStalePages(attempt.invoiceId);
    } else if (attempt.sessionId || this.clock.now().getTime() - Date.parse(attempt.createdAt) > NEVER_MADE_AFTER_MS) {
      await this.unitOfWork.run((manager) => this.settlements.giveUp(manager, attempt.id));
    }
  }
}
