import { Inject, Injectable } from '@nestjs/common';
import type { ReceiptModel } from '@libs/documents';
import type { EntityManager } from 'typeorm';
import { house, type Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopYear } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { HistoryService } from '../history/history.service.js';
import { notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { Invoice } from '../invoices/invoice.entity.js';
import { amountWords } from '../mail/amount-words.js';
import { attentionMail } from '../mail/attention-mail.js';
import { receiptMail } from '../mail/receipt-mail.js';
import { OutboxService } from '../outbox/outbox.service.js';
import { PaperBaseService } from '../papers/paper-base.service.js';
import { PapersService } from '../papers/papers.service.js';
import { addresseeOf } from '../quotes/addressee.js';
import { NumberSeriesService } from '../series/number-series.service.js';
import { ShopService } from '../shop/shop.service.js';
import { Payment } from './payment.entity.js';

export const PAYMENT_SERVICE = house('Payment service');

export interface MoneyIn {
  readonly invoiceId: string;
  readonly kind: Payment['kind'];
  readonly amountMinor: number;
  /** an instant, or a calendar day where only that is known */
  readonly receivedAt: string;
  readonly reference: string;
  /** of the payment service; one row each */
  readonly paymentIntentId: string | null;
  readonly actor: Actor;
}

const KIND = { card: 'by card', 'bank-transfer': 'by bank transfer', cash: 'in cash' } as const;

/** Writes down money that came in: the payment, its receipt, the mail and the history, in the caller's unit. */
@Injectable()
export class PaymentBookService {
  constructor(
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly outbox: OutboxService,
    private readonly papers: PapersService,
    private readonly paperBase: PaperBaseService,
    private readonly series: NumberSeriesService,
    private readonly shop: ShopService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async paidMinor(manager: EntityManager, invoiceId: string): Promise<number> {
    const [sum] = await manager.query<{ paid: number }[]>('SELECT COALESCE(SUM(amountMinor), 0) AS paid FROM payments WHERE invoiceId = ?', [invoiceId]);
    return sum!.paid;
  }

  async write(manager: EntityManager, money: MoneyIn): Promise<void> {
    const invoice = await manager.findOneBy(Invoice, { id: money.invoiceId });
    if (!invoice) throw notFound('invoice');
    const { kind, amountMinor, receivedAt, reference, paymentIntentId, actor } = money;
    const payment: Payment = {
      id: this.ids.next(), invoiceId: invoice.id, customerId: invoice.customerId, kind, amountMinor, currency: invoice.currency, receivedAt, reference, paymentIntentId,
      recordedByUserId: actor.userId, recordedByName: actor.name, createdAt: this.clock.iso(),
    };
    await manager.insert(Payment, payment);
    await manager.update(Invoice, { id: invoice.id }, { version: invoice.version + 1 });
    const paid = await this.paidMinor(manager, invoice.id);
    await this.giveReceipt(manager, invoice, payment, paid, actor);
    const amount = amountWords(amountMinor, invoice.currency);
    await this.history.record(manager, { actor, subject: { kind: 'invoice', id: invoice.id }, jobId: invoice.jobId, event: 'payment.received', words: `${amount} received ${KIND[kind]} for invoice ${invoice.number}.`, data: { paymentId: payment.id, kind, amountMinor, paidMinor: paid, balanceMinor: invoice.grossMinor - paid } });
    if (paid > invoice.grossMinor) await this.askPerson(manager, invoice, 'payment.overpaid', `Invoice ${invoice.number} is paid ${amountWords(paid - invoice.grossMinor, invoice.currency)} over its total: give that back.`);
  }

  /** What no rule decides: kept in the history, and mailed to the shop's own address. */
  async askPerson(manager: EntityManager, invoice: Invoice, event: string, what: string, dedupeKey?: string): Promise<void> {
    await this.history.record(manager, { actor: PAYMENT_SERVICE, subject: { kind: 'invoice', id: invoice.id }, jobId: invoice.jobId, event, words: what });
    const profile = await this.shop.profile();
    if (profile.email === '') return;
    const { jobNumber } = await addresseeOf(manager, invoice.jobId);
    await this.outbox.addMail(manager, {
      kind: 'payment-attention', to: profile.email, jobId: invoice.jobId, ...(dedupeKey ? { dedupeKey } : {}),
      ...attentionMail({ shopName: profile.name, invoiceNumber: invoice.number, jobNumber, what, jobUrl: `${this.config.publicUrl}/jobs/${invoice.jobId}` }),
    });
  }

  private async giveReceipt(manager: EntityManager, invoice: Invoice, payment: Payment, paidMinor: number, actor: Actor): Promise<void> {
    const { id: invoiceId, jobId, customerId, currency, grossMinor } = invoice;
    const profile = await this.shop.profile();
    const to = await addresseeOf(manager, jobId);
    const number = await this.series.next(manager, 'receipt', shopYear(this.clock.now(), this.config.timeZone));
    const balanceMinor = grossMinor - paidMinor;
    const model: ReceiptModel = {
      ...(await this.paperBase.ofJob(manager, jobId, { number })),
      kind: 'receipt',
      invoiceNumber: invoice.number,
      currency,
      payment: { kind: payment.kind, amountMinor: payment.amountMinor, receivedAt: payment.receivedAt, reference: payment.reference, recordedBy: actor.userId ? actor.name : '' },
      invoiceGrossMinor: grossMinor,
      paidMinor,
      balanceMinor,
    };
    const paperId = await this.papers.issue(manager, { kind: 'receipt', number, jobId, customerId, subjectId: payment.id, model, actor });
    const standing = balanceMinor > 0 ? 'part-paid' : balanceMinor < 0 ? 'overpaid' : 'paid';
    await this.outbox.addMail(manager, {
      kind: 'receipt', to: to.email, jobId, customerId, paperIds: [paperId], dedupeKey: `receipt:${payment.paymentIntentId ?? payment.id}`,
      ...receiptMail({ ...to, shopName: profile.name, receiptNumber: number, invoiceNumber: invoice.number, amount: amountWords(payment.amountMinor, currency), kind: payment.kind, balance: amountWords(Math.abs(balanceMinor), currency), standing, portalUrl: to.hasPortal ? `${this.config.publicUrl}/portal/invoices/${invoiceId}` : null }),
    });
  }
}
