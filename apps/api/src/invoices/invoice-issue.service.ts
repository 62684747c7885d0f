import { Inject, Injectable } from '@nestjs/common';
import type { InvoiceView, IssueInvoice } from '@shared/invoices';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopYear } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { Job } from '../jobs/job.entity.js';
import { amountWords } from '../mail/amount-words.js';
import { bankWords, invoiceMail } from '../mail/invoice-mail.js';
import { OutboxService } from '../outbox/outbox.service.js';
import { PaperBaseService } from '../papers/paper-base.service.js';
import { PapersService } from '../papers/papers.service.js';
import { addresseeOf } from '../quotes/addressee.js';
import { QuoteLineRow } from '../quotes/quote-line.entity.js';
import { Quote } from '../quotes/quote.entity.js';
import { NumberSeriesService } from '../series/number-series.service.js';
import { ShopService } from '../shop/shop.service.js';
import { InvoiceLineRow } from './invoice-line.entity.js';
import { invoicePaper } from './invoice-paper.js';
import { dueDate } from './invoice-terms.js';
import { Invoice } from './invoice.entity.js';
import { InvoicesService } from './invoices.service.js';

/** Issues an invoice from an approved quote, once. What is issued does not change any more. */
@Injectable()
export class InvoiceIssueService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly outbox: OutboxService,
    private readonly papers: PapersService,
    private readonly paperBase: PaperBaseService,
    private readonly series: NumberSeriesService,
    private readonly shop: ShopService,
    private readonly invoices: InvoicesService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async issue(actor: Actor, jobId: string, input: IssueInvoice): Promise<InvoiceView> {
    const profile = await this.shop.profile();
    const id = await this.unitOfWork.run(async (manager) => {
      const quote = await this.quoteToBill(manager, jobId, input);
      const to = await addresseeOf(manager, jobId);
      const number = await this.series.next(manager, 'invoice', shopYear(this.clock.now(), this.config.timeZone));
      const issuedOn = this.invoices.today();
      const { customerId, currency, netMinor, taxMinor, grossMinor } = quote;
      const invoice = { id: this.ids.next(), number, jobId, customerId, quoteId: quote.id, currency, netMinor, taxMinor, grossMinor, issuedAt: this.clock.iso(), issuedOn, dueOn: dueDate(issuedOn, to), issuedByUserId: actor.userId!, version: 1 };
      const lines = (await manager.find(QuoteLineRow, { where: { quoteId: quote.id }, order: { position: 'ASC' } })).map(({ id: _id, quoteId: _quoteId, ...line }) => line);
      const portalUrl = to.hasPortal ? `${this.config.publicUrl}/portal/invoices/${invoice.id}` : null;
      const head = await this.paperBase.ofJob(manager, jobId, { number });
      const paperId = await this.papers.issue(manager, {
        kind: 'invoice', number, jobId, customerId, subjectId: invoice.id, actor,
        model: invoicePaper(head, { invoice, lines, quote, terms: to, releasedAt: to.releasedAt, bank: profile.bank, payUrl: grossMinor > 0 ? portalUrl : null }),
      });
      await manager.insert(Invoice, { ...invoice, paperId });
      for (const line of lines) await manager.insert(InvoiceLineRow, { ...line, id: this.ids.next(), invoiceId: invoice.id });
      const gross = amountWords(grossMinor, currency);
      await this.outbox.addMail(manager, {
        kind: 'invoice', to: to.email, jobId, customerId, paperIds: [paperId], dedupeKey: `invoice:${invoice.id}`,
        ...invoiceMail({ ...to, shopName: profile.name, invoiceNumber: number, gross, nothingToPay: grossMinor === 0, dueOn: invoice.dueOn, prepayment: to.terms === 'prepayment', bankLine: bankWords(profile.bank), portalUrl }),
      });
      await this.history.record(manager, { actor, subject: { kind: 'invoice', id: invoice.id }, jobId, event: 'invoice.issued', words: `Invoice ${number} issued from quote ${quote.number}: ${gross}, due ${invoice.dueOn}.`, data: { quoteId: quote.id, grossMinor, currency, paperId } });
      return invoice.id;
    });
    return this.invoices.one(id);
  }

  private async quoteToBill(manager: EntityManager, jobId: string, input: IssueInvoice): Promise<Quote> {
    const job = await manager.findOneBy(Job, { id: jobId });
    if (!job) throw notFound('job');
    const quote = await manager.findOneBy(Quote, { id: input.quoteId, jobId });
    if (!quote) throw notFound('quote');
    const issued = await manager.findOneBy(Invoice, { quoteId: quote.id });
    if (issued) throw new AppError('ALREADY_DONE', `Invoice ${issued.number} was issued from this quote already.`);
    if (job.version !== input.jobVersion) throw changedMeanwhile('job', { id: job.id, number: job.number, step: job.step, state: job.state, version: job.version });
    if (quote.state !== 'approved') throw new AppError('STATE_NOT_RIGHT', 'An invoice is issued from an approved quote: have this one approved first.');
    return quote;
  }
}
