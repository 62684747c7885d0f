import { Injectable, Logger } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { AppError } from '../http/app-error.js';
import { Invoice } from '../invoices/invoice.entity.js';
import { PaymentBookService } from './payment-book.service.js';
import { PaymentEvent } from './payment-event.entity.js';
import { EventNotSigned, PaymentService, PaymentServiceDown, type PaymentEventHint, type SessionFacts } from './payment-service.js';
import { Payment } from './payment.entity.js';
import { SettleService } from './settle.service.js';

/** Money that goes back is not booked here yet: a person is told. */
const FOR_A_PERSON: Record<string, string> = {
  'charge.dispute.created': 'The card holder disputes a payment',
  'charge.dispute.closed': 'A dispute about a payment is closed',
  'refund.created': 'A payment is being given back',
  'refund.failed': 'Giving back a payment failed',
};

/** Events of the payment service: a hint that something happened. What did is asked of the service itself. */
@Injectable()
export class PaymentEventsService {
  private readonly log = new Logger('PaymentEvents');

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly service: PaymentService,
    private readonly settlements: SettleService,
    private readonly book: PaymentBookService,
  ) {}

  /** Answers once the event is remembered together with its effect; until then it is to be sent again. */
  async receive(body: Buffer | undefined, signature: string | undefined): Promise<{ received: true }> {
    const event = this.read(body, signature);
    if (await this.db.one('SELECT id FROM payment_events WHERE id = ?', [event.id])) return { received: true };
    const session = await this.sessionOf(event);
    await this.unitOfWork.run(async (manager) => {
      if (await manager.existsBy(PaymentEvent, { id: event.id })) return;
      const outcome = session ? await this.effect(manager, event, session) : 'nothing-to-do';
      await manager.insert(PaymentEvent, { id: event.id, type: event.type, objectId: event.objectId, receivedAt: this.clock.iso(), outcome });
    });
    return { received: true };
  }

  private read(body: Buffer | undefined, signature: string | undefined): PaymentEventHint {
    try {
      return this.service.readEvent(body ?? Buffer.alloc(0), signature, this.clock.now());
    } catch (error) {
      if (!(error instanceof EventNotSigned)) throw error;
      this.log.warn(error.message);
      throw new AppError('SIGNATURE_NOT_VALID', 'This event does not carry the payment service’s signature of now.');
    }
  }

  private async sessionOf(event: PaymentEventHint): Promise<SessionFacts | null> {
    try {
      if (event.sessionId) return await this.service.session(event.sessionId);
      return event.intentId ? await this.service.sessionOfIntent(event.intentId) : null;
    } catch (error) {
      if (!(error instanceof PaymentServiceDown)) throw error;
      throw new AppError('PAYMENT_SERVICE_UNREACHABLE', 'The payment service does not answer; send this event again later.', { cause: error });
    }
  }

  private async effect(manager: EntityManager, event: PaymentEventHint, session: SessionFacts): Promise<string> {
    const settled = await this.settlements.settle(manager, session);
    const what = FOR_A_PERSON[event.type];
    const payment = what && session.payment ? await manager.findOneBy(Payment, { paymentIntentId: session.payment.intentId }) : null;
    if (!payment) return settled;
    const invoice = await manager.findOneByOrFail(Invoice, { id: payment.invoiceId });
    await this.book.askPerson(manager, invoice, 'payment.needs-person', `${what}: invoice ${invoice.number}, payment ${payment.paymentIntentId}.`, `payment-attention:${event.id}`);
    return 'needs-person';
  }
}
