import { Injectable } from '@nestjs/common';
import { IsNull, type EntityManager } from 'typeorm';
import { Clock } from '../clock/clock.js';
import { HistoryService } from '../history/history.service.js';
import { Invoice } from '../invoices/invoice.entity.js';
import { CheckoutAttempt } from './checkout-attempt.entity.js';
import { PAYMENT_SERVICE, PaymentBookService } from './payment-book.service.js';
import type { SessionFacts } from './payment-service.js';
import { Payment } from './payment.entity.js';
import { settlementOf } from './settlement.js';

/** How an invoice's payment page stands after it was looked at. */
export type Settled = 'paid' | 'under-way' | 'open' | 'closed' | 'needs-person' | 'not-ours';

/**
 * The one place where what the payment service says becomes money of ours. Event, return page, pay button and the
 * minute's look-round all end here; it may be called any number of times, in any order, for one payment page.
 */
@Injectable()
export class SettleService {
  constructor(
    private readonly clock: Clock,
    private readonly history: HistoryService,
    private readonly book: PaymentBookService,
  ) {}

  async settle(manager: EntityManager, session: SessionFacts): Promise<Settled> {
    const attempt = await this.attemptOf(manager, session);
    if (!attempt) return 'not-ours';
    const booked = session.payment ? await manager.existsBy(Payment, { paymentIntentId: session.payment.intentId }) : false;
    const settlement = settlementOf(attempt, session, booked);
    switch (settlement.kind) {
      case 'pay':
        await this.book.write(manager, { invoiceId: attempt.invoiceId, kind: 'card', amountMinor: settlement.amountMinor, receivedAt: settlement.payment.receivedAt ?? this.clock.iso(), reference: settlement.payment.reference, paymentIntentId: settlement.payment.intentId, actor: PAYMENT_SERVICE });
        await this.stands(manager, attempt, 'complete');
        return 'paid';
      case 'needs-person':
        await this.askPerson(manager, attempt, session, settlement.why);
        await this.stands(manager, attempt, 'complete');
        return 'needs-person';
      case 'closed':
        await this.stands(manager, attempt, 'expired');
        return 'closed';
      case 'under-way':
        return 'under-way';
      case 'nothing-new':
        return standingNow(attempt, session, booked);
    }
  }

  /** Gives an attempt up whose page the service does not know. */
  async giveUp(manager: EntityManager, attemptId: string): Promise<void> {
    const attempt = await manager.findOneBy(CheckoutAttempt, { id: attemptId });
    if (attempt && (attempt.state === 'asked' || attempt.state === 'open')) await this.stands(manager, attempt, 'expired');
  }

  /** The attempt a page belongs to; a page whose answer never reached us is taken on by the mark we put on it. */
  private async attemptOf(manager: EntityManager, session: SessionFacts): Promise<CheckoutAttempt | null> {
    const known = await manager.findOneBy(CheckoutAttempt, { sessionId: session.sessionId });
    if (known || !session.attemptId) return known;
    const asked = await manager.findOneBy(CheckoutAttempt, { id: session.attemptId, sessionId: IsNull() });
    if (!asked) return null;
    const taken = { sessionId: session.sessionId, url: session.url, state: asked.state === 'asked' ? ('open' as const) : asked.state, version: asked.version + 1 };
    await manager.update(CheckoutAttempt, { id: asked.id }, taken);
    const invoice = await manager.findOneByOrFail(Invoice, { id: asked.invoiceId });
    await this.history.record(manager, { actor: PAYMENT_SERVICE, subject: { kind: 'invoice', id: invoice.id }, jobId: invoice.jobId, event: 'payment.page-opened', words: `Payment page opened for invoice ${invoice.number}.`, data: { attempt: asked.attempt, amountMinor: asked.amountMinor } });
    return { ...asked, ...taken };
  }

  private async stands(manager: EntityManager, attempt: CheckoutAttempt, state: 'complete' | 'expired'): Promise<void> {
    await manager.update(CheckoutAttempt, { id: attempt.id }, { state, version: attempt.version + 1 });
  }

  private async askPerson(manager: EntityManager, attempt: CheckoutAttempt, session: SessionFacts, why: string): Promise<void> {
    const invoice = await manager.findOneByOrFail(Invoice, { id: attempt.invoiceId });
    const words = `A payment came in through the payment page of invoice ${invoice.number} that was not applied: ${why}. Payment ${session.payment?.intentId ?? ''}.`;
    await this.book.askPerson(manager, invoice, 'payment.needs-person', words, `payment-attention:${session.payment?.intentId}`);
  }
}

function standingNow(attempt: CheckoutAttempt, session: SessionFacts, booked: boolean): Settled {
  if (booked) return 'paid';
  if (attempt.state === 'complete') return 'needs-person';
  return attempt.state === 'expired' || session.status === 'expired' ? 'closed' : 'open';
}
