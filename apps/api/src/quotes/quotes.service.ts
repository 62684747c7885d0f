import { Inject, Injectable } from '@nestjs/common';
import type { CreateQuote, QuoteView, UpdateQuote, VersionOnly } from '@shared/quotes';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopDate, shopYear } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { Job } from '../jobs/job.entity.js';
import { amountWords } from '../mail/amount-words.js';
import { quoteMail } from '../mail/quote-mail.js';
import { OutboxService } from '../outbox/outbox.service.js';
import { PaperBaseService } from '../papers/paper-base.service.js';
import { PapersService } from '../papers/papers.service.js';
import { NumberSeriesService } from '../series/number-series.service.js';
import { ShopService } from '../shop/shop.service.js';
import { addresseeOf } from './addressee.js';
import { QuoteLineRow } from './quote-line.entity.js';
import { quotePaper, quotePaperNumber } from './quote-paper.js';
import { isExpired, moveRefusal, nextQuoteState, type QuoteAct } from './quote-state.js';
import { sumsOf, type Sums } from './quote-sums.js';
import { QUOTE_SELECT, toQuoteView, type QuoteRow } from './quote-view.js';
import { Quote } from './quote.entity.js';

/** The shop's side of quotes: draft, change, send, revise. Sums are computed here and nowhere else. */
@Injectable()
export class QuotesService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
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

  today(): string {
    return shopDate(this.clock.now(), this.config.timeZone);
  }

  async one(quoteId: string): Promise<QuoteView> {
    const row = await this.db.one<QuoteRow>(`${QUOTE_SELECT} WHERE q.id = ?`, [quoteId]);
    if (!row) throw notFound('quote');
    return toQuoteView(row, this.today());
  }

  async ofJob(jobId: string): Promise<QuoteView[]> {
    if (!(await this.db.one('SELECT id FROM jobs WHERE id = ?', [jobId]))) throw notFound('job');
    const rows = await this.db.all<QuoteRow>(`${QUOTE_SELECT} WHERE q.jobId = ? ORDER BY q.createdAt DESC, q.id DESC`, [jobId]);
    return rows.map((row) => toQuoteView(row, this.today()));
  }

  /** The quote as it stands inside a unit. */
  async viewIn(manager: EntityManager, quoteId: string): Promise<QuoteView> {
    const [row] = await manager.query<QuoteRow[]>(`${QUOTE_SELECT} WHERE q.id = ?`, [quoteId]);
    if (!row) throw notFound('quote');
    return toQuoteView(row, this.today());
  }

  async create(actor: Actor, jobId: string, input: CreateQuote): Promise<QuoteView> {
    const { currency } = await this.shop.profile();
    this.refusePastDate(input.validUntil);
    const sums = sumsOf(input.lines);
    const id = await this.unitOfWork.run(async (manager) => {
      const job = await manager.findOneBy(Job, { id: jobId });
      if (!job) throw notFound('job');
      const number = await this.series.next(manager, 'quote', shopYear(this.clock.now(), this.config.timeZone));
      const quote = this.draft(actor, { jobId, customerId: job.customerId, number, revision: 1, currency, validUntil: input.validUntil, note: input.note }, sums);
      await manager.insert(Quote, quote);
      await this.writeLines(manager, quote.id, sums);
      await this.history.record(manager, { actor, subject: { kind: 'quote', id: quote.id }, jobId, event: 'quote.drafted', words: `Quote ${number} drafted: ${amountWords(sums.grossMinor, currency)}.`, data: { grossMinor: sums.grossMinor, currency } });
      return quote.id;
    });
    return this.one(id);
  }

  async update(actor: Actor, quoteId: string, input: UpdateQuote): Promise<QuoteView> {
    this.refusePastDate(input.validUntil);
    await this.unitOfWork.run(async (manager) => {
      const quote = await this.forAct(manager, quoteId, input.version, 'change');
      const sums = sumsOf(input.lines);
      const { netMinor, taxMinor, grossMinor } = sums;
      await manager.update(Quote, { id: quoteId }, { netMinor, taxMinor, grossMinor, validUntil: input.validUntil, note: input.note, version: quote.version + 1 });
      await manager.delete(QuoteLineRow, { quoteId });
      await this.writeLines(manager, quoteId, sums);
      await this.history.record(manager, { actor, subject: { kind: 'quote', id: quoteId }, jobId: quote.jobId, event: 'quote.changed', words: `Quote ${quote.number} changed: ${amountWords(grossMinor, quote.currency)}.`, data: { from: { grossMinor: quote.grossMinor }, to: { grossMinor } } });
    });
    return this.one(quoteId);
  }

  /** The paper is issued and the mail promised in the same unit; from here on the customer can answer. */
  async send(actor: Actor, quoteId: string, { version }: VersionOnly): Promise<QuoteView> {
    const profile = await this.shop.profile();
    await this.unitOfWork.run(async (manager) => {
      const quote = await this.forAct(manager, quoteId, version, 'send');
      if (isExpired(quote.validUntil, this.today())) throw new AppError('STATE_NOT_RIGHT', 'The quote’s last day of validity has passed: give it a later one first.');
      await manager.update(Quote, { id: quoteId }, { state: 'sent', sentAt: this.clock.iso(), version: quote.version + 1 });
      const to = await addresseeOf(manager, quote.jobId);
      const portalUrl = to.hasPortal ? `${this.config.publicUrl}/portal/quotes/${quoteId}` : null;
      const head = await this.paperBase.ofJob(manager, quote.jobId, { number: quote.number });
      const paperId = await this.papers.issue(manager, {
        kind: 'quote',
        number: quotePaperNumber(quote),
        jobId: quote.jobId,
        customerId: quote.customerId,
        subjectId: quoteId,
        model: quotePaper(head, await this.viewIn(manager, quoteId), portalUrl),
        actor,
        ...(await this.earlierPaper(manager, quote)),
      });
      await this.outbox.addMail(manager, {
        kind: 'quote',
        to: to.email,
        ...quoteMail({ ...to, shopName: profile.name, shopPhone: profile.phone, quoteNumber: quote.number, revision: quote.revision, gross: amountWords(quote.grossMinor, quote.currency), validUntil: quote.validUntil, note: quote.note, portalUrl }),
        jobId: quote.jobId,
        customerId: quote.customerId,
        paperIds: [paperId],
        dedupeKey: `quote-sent:${quoteId}`,
      });
      await this.history.record(manager, { actor, subject: { kind: 'quote', id: quoteId }, jobId: quote.jobId, event: 'quote.sent', words: `Quote ${quotePaperNumber(quote)} sent to ${to.email}: ${amountWords(quote.grossMinor, quote.currency)}.`, data: { paperId, grossMinor: quote.grossMinor } });
    });
    return this.one(quoteId);
  }

  /** A new draft with the same lines; the older quote goes out of force at once and cannot be approved any more. */
  async revise(actor: Actor, quoteId: string, { version }: VersionOnly): Promise<QuoteView> {
    const id = await this.unitOfWork.run(async (manager) => {
      const older = await this.forAct(manager, quoteId, version, 'revise');
      const [invoice] = await manager.query<{ number: string }[]>('SELECT number FROM invoices WHERE quoteId = ?', [quoteId]);
      if (invoice) throw new AppError('STATE_NOT_RIGHT', `Invoice ${invoice.number} was issued from this quote: make a new quote for what comes on top.`);
      const next = { ...this.draft(actor, { ...older, revision: older.revision + 1 }, older) };
      await manager.update(Quote, { id: quoteId }, { state: 'superseded', version: older.version + 1 });
      await manager.insert(Quote, next);
      for (const line of await manager.find(QuoteLineRow, { where: { quoteId }, order: { position: 'ASC' } })) {
        await manager.insert(QuoteLineRow, { ...line, id: this.ids.next(), quoteId: next.id });
      }
      const words = `Quote ${older.number} revised: revision ${next.revision} drafted, revision ${older.revision} out of force${older.state === 'approved' ? ' with its approval' : ''}.`;
      await this.history.record(manager, { actor, subject: { kind: 'quote', id: next.id }, jobId: older.jobId, event: 'quote.revised', words, data: { from: { quoteId, revision: older.revision, state: older.state }, to: { quoteId: next.id, revision: next.revision } } });
      return next.id;
    });
    return this.one(id);
  }

  /** Finds the quote, and refuses when somebody changed it meanwhile or the act is not possible. */
  private async forAct(manager: EntityManager, quoteId: string, version: number, act: QuoteAct): Promise<Quote> {
    const quote = await manager.findOneBy(Quote, { id: quoteId });
    if (!quote) throw notFound('quote');
    if (quote.version !== version) throw changedMeanwhile('quote', await this.viewIn(manager, quoteId));
    if (!nextQuoteState(quote.state, act)) throw new AppError('STATE_NOT_RIGHT', moveRefusal(quote.state, act));
    return quote;
  }

  private draft(actor: Actor, from: Pick<Quote, 'jobId' | 'customerId' | 'number' | 'revision' | 'currency' | 'validUntil' | 'note'>, sums: Pick<Sums, 'netMinor' | 'taxMinor' | 'grossMinor'>): Quote {
    const { jobId, customerId, number, revision, currency, validUntil, note } = from;
    const { netMinor, taxMinor, grossMinor } = sums;
    return {
      id: this.ids.next(), jobId, customerId, number, revision, state: 'draft', currency, netMinor, taxMinor, grossMinor, validUntil, note,
      sentAt: null, approvedHow: null, approvedBy: null, approvedAt: null, purchaseOrder: '', notToExceedMinor: null, declineReason: null,
      createdAt: this.clock.iso(), createdByUserId: actor.userId!, version: 1,
    };
  }

  private async writeLines(manager: EntityManager, quoteId: string, sums: Sums): Promise<void> {
    for (const [index, line] of sums.lines.entries()) await manager.insert(QuoteLineRow, { id: this.ids.next(), quoteId, position: index + 1, ...line });
  }

  private async earlierPaper(manager: EntityManager, quote: Quote): Promise<{ supersedesId?: string }> {
    const [paper] = await manager.query<{ id: string }[]>(
      `SELECT p.id FROM papers p JOIN quotes q ON q.id = p.subjectId WHERE p.kind = 'quote' AND q.number = ? AND q.revision < ? AND p.supersededById IS NULL ORDER BY q.revision DESC LIMIT 1`,
      [quote.number, quote.revision],
    );
    return paper ? { supersedesId: paper.id } : {};
  }

  private refusePastDate(validUntil: string): void {
    if (!isExpired(validUntil, this.today())) return;
    const message = 'This day has passed; give a later one.';
    throw new AppError('INPUT_NOT_VALID', message, { fields: [{ path: 'validUntil', code: 'past', message }] });
  }
}
