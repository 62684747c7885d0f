import { Inject, Injectable, Logger } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import type { PaymentReturn, StartCheckout } from '@shared/invoices';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { requestContext } from '../http/request-context.js';
import { Ids } from '../ids/ids.js';
import { Invoice } from '../invoices/invoice.entity.js';
import { invoiceForCustomer } from '../invoices/invoice-view.js';
import { InvoicesService } from '../invoices/invoices.service.js';
import { CheckoutAttempt } from './checkout-attempt.entity.js';
import { PaymentBookService } from './payment-book.service.js';
import { AmountNotTaken, PaymentService, PaymentServiceDown, type SessionFacts } from './payment-service.js';
import { SettleService, type Settled } from './settle.service.js';

/** An attempt as the unit left it, with what the invoice owes at that moment. */
interface Begun {
  readonly attempt: CheckoutAttempt;
  readonly invoiceNumber: string;
  readonly balanceMinor: number;
}

/** A page is looked at, closed or given up a few times at most before the customer is asked to try again. */
const TRIES = 4;

/** The customer's way to the payment page and back. The service is never called inside a unit of work. */
@Injectable()
export class CheckoutService {
  private readonly log = new Logger('Checkout');
  private readonly starting = new Map<string, Promise<{ url: string }>>();

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly service: PaymentService,
    private readonly settlements: SettleService,
    private readonly book: PaymentBookService,
    private readonly invoices: InvoicesService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  /** Many clicks at once of one customer on one invoice are one request to the service. */
  start(actor: Actor, invoiceId: string, { version }: StartCheckout): Promise<{ url: string }> {
    const name = `${actor.customerId}|${invoiceId}|${version}`;
    const running = this.starting.get(name) ?? this.startOnce(actor, invoiceId, version).finally(() => this.starting.delete(name));
    this.starting.set(name, running);
    return running;
  }

  /** The customer came back: what happened is asked of the service, whether or not its event has arrived. */
  async cameBack(actor: Actor, invoiceId: string, sessionId: string): Promise<PaymentReturn> {
    const own = await this.db.one('SELECT id FROM checkout_attempts WHERE sessionId = ? AND invoiceId = ? AND customerId = ?', [sessionId, invoiceId, actor.customerId]);
    if (!own) throw notFound('payment');
    const settled = await this.standingOf(sessionId).catch((error: unknown) => this.whileDown(actor, invoiceId, error));
    const outcome = settled === 'paid' ? 'paid' : settled === 'under-way' || settled === 'needs-person' ? 'not-yet' : 'not-paid';
    return { invoice: await this.invoices.ofCustomer(actor, invoiceId), outcome };
  }

  private async standingOf(sessionId: string): Promise<Settled> {
    const session = await this.service.session(sessionId);
    return session ? this.settleIn(session) : 'closed';
  }

  /** What is booked is known without the service. */
  private async whileDown(actor: Actor, invoiceId: string, error: unknown): Promise<Settled> {
    if (!(error instanceof PaymentServiceDown)) throw error;
    if ((await this.invoices.ofCustomer(actor, invoiceId)).state === 'paid') return 'paid';
    throw new AppError('PAYMENT_SERVICE_UNREACHABLE', 'The payment service does not answer right now. If you have paid, nothing is lost: the invoice shows it as soon as the service is back.', { cause: error });
  }

  /** Closes pages that ask for an amount the invoice does not owe any more, so that nobody pays twice. */
  async closeStalePages(invoiceId: string): Promise<void> {
    const stale = await this.db.all<{ sessionId: string }>(
      `SELECT a.sessionId FROM checkout_attempts a JOIN invoices i ON i.id = a.invoiceId WHERE a.invoiceId = ? AND a.state = 'open' AND a.sessionId IS NOT NULL
         AND a.amountMinor <> i.grossMinor - COALESCE((SELECT SUM(p.amountMinor) FROM payments p WHERE p.invoiceId = i.id), 0)`,
      [invoiceId],
    );
    for (const { sessionId } of stale) {
      const session = await this.service.closePage(sessionId);
      if (session) await this.settleIn(session);
    }
  }

  private async startOnce(actor: Actor, invoiceId: string, version: number): Promise<{ url: string }> {
    for (let tries = 0; tries < TRIES; tries += 1) {
      const begun = await this.unit((manager) => this.begin(manager, actor, invoiceId, version));
      const session = await this.pageOf(begun).catch((error: unknown) => this.afterFailure(begun, error));
      const settled = session ? await this.settleIn(session) : 'closed';
      if (settled === 'under-way') throw new AppError('STATE_NOT_RIGHT', 'Your payment is on its way; the bank has not confirmed it yet. Nothing more is needed.');
      if (settled === 'needs-person') throw new AppError('STATE_NOT_RIGHT', 'A payment for this invoice came in that the shop has to look at. Speak with the shop before you pay again.');
      if (!session) await this.unit((manager) => this.settlements.giveUp(manager, begun.attempt.id));
      if (settled !== 'open' || !session?.url) continue;
      if (begun.attempt.amountMinor === begun.balanceMinor) return { url: session.url };
      const closed = await this.service.closePage(session.sessionId).catch(refused);
      if (closed) await this.settleIn(closed);
    }
    throw unreachable();
  }

  /** The attempt that is under way, or a new one for what is owed now. The amount comes from here and nowhere else. */
  private async begin(manager: EntityManager, actor: Actor, invoiceId: string, version: number): Promise<Begun> {
    const invoice = await manager.findOneBy(Invoice, { id: invoiceId, customerId: actor.customerId ?? '' });
    if (!invoice) throw notFound('invoice');
    const balanceMinor = invoice.grossMinor - (await this.book.paidMinor(manager, invoiceId));
    if (balanceMinor <= 0) throw new AppError('ALREADY_DONE', 'This invoice is paid. Nothing more is needed.');
    if (invoice.version !== version) throw changedMeanwhile('invoice', invoiceForCustomer(await this.invoices.viewIn(manager, invoiceId)));
    const [last] = await manager.find(CheckoutAttempt, { where: { invoiceId }, order: { attempt: 'DESC' }, take: 1 });
    if (last && (last.state === 'asked' || last.state === 'open')) return { attempt: last, invoiceNumber: invoice.number, balanceMinor };
    const attempt: CheckoutAttempt = {
      id: this.ids.next(), invoiceId, customerId: invoice.customerId, attempt: (last?.attempt ?? 0) + 1, amountMinor: balanceMinor, currency: invoice.currency,
      sessionId: null, url: null, state: 'asked', createdAt: this.clock.iso(), version: 1,
    };
    await manager.insert(CheckoutAttempt, attempt);
    return { attempt, invoiceNumber: invoice.number, balanceMinor };
  }

  /** The attempt's page at the service. One that was asked for is asked for again under the same key: it exists once. */
  private pageOf({ attempt, invoiceNumber }: Begun): Promise<SessionFacts | null> {
    if (attempt.sessionId) return this.service.session(attempt.sessionId);
    const { id: attemptId, invoiceId, amountMinor, currency } = attempt;
    const invoiceUrl = `${this.config.publicUrl}/portal/invoices/${invoiceId}`;
    return this.service.openPage({
      attemptId, invoiceId, invoiceNumber, amountMinor, currency,
      successUrl: `${invoiceUrl}/paid?session_id={CHECKOUT_SESSION_ID}`,
      cancelUrl: invoiceUrl,
      idempotencyKey: `invoice:${invoiceId}:${attempt.attempt}:${amountMinor}`,
    });
  }

  /**
   * A failure of the service's own is ambiguous, and stays its answer to this key: the page is looked for by the mark
   * we put on it. Without one the attempt is given up, and the next try has a key of its own.
   */
  private async afterFailure({ attempt }: Begun, error: unknown): Promise<SessionFacts | null> {
    if (error instanceof AmountNotTaken) {
      await this.unit((manager) => this.settlements.giveUp(manager, attempt.id));
      throw new AppError('AMOUNT_NOT_RIGHT', 'This amount cannot be paid through the payment page. Pay by bank transfer; the account stands on the invoice.', { cause: error });
    }
    if (!(error instanceof PaymentServiceDown)) throw error;
    this.log.warn(error.message);
    if (attempt.sessionId || !error.answeredWithFailure) throw unreachable(error);
    const found = await this.service.sessionOfAttempt(attempt.id).catch(refused);
    if (found) return found;
    await this.unit((manager) => this.settlements.giveUp(manager, attempt.id));
    throw unreachable(error);
  }

  private settleIn(session: SessionFacts): Promise<Settled> {
    return this.unit((manager) => this.settlements.settle(manager, session));
  }

  /**
   * These units stand apart from the request's own idempotency key: asked again, the same page is found again, and a
   * key taken by the first of several units would keep the customer from trying again after a failure.
   */
  private unit<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    return requestContext.run({ requestId: requestContext.getStore()?.requestId ?? '' }, () => this.unitOfWork.run(work));
  }
}

const unreachable = (cause?: unknown) => new AppError('PAYMENT_SERVICE_UNREACHABLE', 'The payment service does not answer right now. Nothing is lost: try again in a minute, or pay by bank transfer.', { cause });

function refused(error: unknown): never {
  throw error instanceof PaymentServiceDown ? unreachable(error) : error;
}
