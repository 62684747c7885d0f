import { Inject, Injectable } from '@nestjs/common';
import type { ApproveForCustomer, ApproveInPortal, DeclineQuote, QuoteView } from '@shared/quotes';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { amountWords } from '../mail/amount-words.js';
import { approvalMail } from '../mail/approval-mail.js';
import { momentWords } from '../mail/day-words.js';
import { OutboxService } from '../outbox/outbox.service.js';
import { ShopService } from '../shop/shop.service.js';
import { addresseeOf } from './addressee.js';
import { approvalProblem } from './approval-rules.js';
import { isDoneAlready, isExpired, moveRefusal, nextQuoteState, type QuoteAct } from './quote-state.js';
import { QUOTE_SELECT, quoteForCustomer, toQuoteView, type QuoteRow } from './quote-view.js';
import { Quote } from './quote.entity.js';
import { QuotesService } from './quotes.service.js';

interface Approval {
  readonly how: 'portal' | 'phone' | 'purchase-order';
  readonly by: string;
  readonly at: string;
  readonly purchaseOrder: string;
  readonly notToExceedMinor: number | null;
}
const HOW = { portal: 'in the portal', phone: 'by phone', 'purchase-order': 'by purchase order' } as const;

/** The customer's answer to a quote: given in the portal, or taken down by the shop. */
@Injectable()
export class QuoteAnswersService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly history: HistoryService,
    private readonly outbox: OutboxService,
    private readonly shop: ShopService,
    private readonly quotes: QuotesService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  /** A quote as its customer may see it: their own, and never a draft. */
  async ofCustomer(actor: Actor, quoteId: string): Promise<QuoteView> {
    const row = await this.db.one<QuoteRow>(`${QUOTE_SELECT} WHERE q.id = ? AND q.customerId = ? AND q.state <> 'draft'`, [quoteId, actor.customerId]);
    if (!row) throw notFound('quote');
    return quoteForCustomer(toQuoteView(row, this.quotes.today()));
  }

  async approveForCustomer(actor: Actor, quoteId: string, input: ApproveForCustomer): Promise<QuoteView> {
    await this.unitOfWork.run(async (manager) => {
      const quote = await manager.findOneBy(Quote, { id: quoteId });
      if (!quote) throw notFound('quote');
      await this.refuseUnlessOpen(manager, quote, input.version, 'approve');
      const problem = approvalProblem(input, quote, this.clock.now(), (minor) => amountWords(minor, quote.currency));
      if (problem) throw new AppError(problem.code, problem.words, { fields: [{ path: problem.path, code: 'approval', message: problem.words }] });
      await this.approve(manager, actor, quote, { how: input.how, by: input.approvedBy, at: new Date(input.approvedAt).toISOString(), purchaseOrder: input.purchaseOrder, notToExceedMinor: input.notToExceedMinor });
    });
    return this.quotes.one(quoteId);
  }

  async approveInPortal(actor: Actor, quoteId: string, input: ApproveInPortal): Promise<QuoteView> {
    await this.unitOfWork.run(async (manager) => {
      const quote = await this.ownForAnswer(manager, actor, quoteId, input.version, 'approve');
      await this.approve(manager, actor, quote, { how: 'portal', by: input.name, at: this.clock.iso(), purchaseOrder: input.purchaseOrder, notToExceedMinor: null });
    });
    return this.ofCustomer(actor, quoteId);
  }

  async declineInPortal(actor: Actor, quoteId: string, input: DeclineQuote): Promise<QuoteView> {
    await this.unitOfWork.run(async (manager) => {
      const quote = await this.ownForAnswer(manager, actor, quoteId, input.version, 'decline');
      await manager.update(Quote, { id: quoteId }, { state: 'declined', declineReason: input.reason, version: quote.version + 1 });
      await this.history.record(manager, { actor, subject: { kind: 'quote', id: quoteId }, jobId: quote.jobId, event: 'quote.declined', words: `Quote ${quote.number} declined in the portal: ${input.reason}`, data: { revision: quote.revision, reason: input.reason } });
    });
    return this.ofCustomer(actor, quoteId);
  }

  /** Drafts and quotes of others answer as if they were not there; an expired one is for the shop to renew. */
  private async ownForAnswer(manager: EntityManager, actor: Actor, quoteId: string, version: number, act: QuoteAct): Promise<Quote> {
    const quote = await manager.findOneBy(Quote, { id: quoteId, customerId: actor.customerId ?? '' });
    if (!quote || quote.state === 'draft') throw notFound('quote');
    await this.refuseUnlessOpen(manager, quote, version, act, quoteForCustomer);
    if (act === 'approve' && isExpired(quote.validUntil, this.quotes.today())) throw new AppError('STATE_NOT_RIGHT', 'This quote is past its last day. Ask the shop to renew it; nothing you typed is lost.');
    return quote;
  }

  /** How it stands comes first, since it says more than that something changed. */
  private async refuseUnlessOpen(manager: EntityManager, quote: Quote, version: number, act: QuoteAct, seen: (view: QuoteView) => QuoteView = (view) => view): Promise<void> {
    if (!nextQuoteState(quote.state, act)) throw new AppError(isDoneAlready(quote.state, act) ? 'ALREADY_DONE' : 'STATE_NOT_RIGHT', moveRefusal(quote.state, act));
    if (quote.version !== version) throw changedMeanwhile('quote', seen(await this.quotes.viewIn(manager, quote.id)));
  }

  private async approve(manager: EntityManager, actor: Actor, quote: Quote, approval: Approval): Promise<void> {
    const { how, by, at, purchaseOrder, notToExceedMinor } = approval;
    await manager.update(Quote, { id: quote.id }, { state: 'approved', approvedHow: how, approvedBy: by, approvedAt: at, purchaseOrder, notToExceedMinor, version: quote.version + 1 });
    const profile = await this.shop.profile();
    const to = await addresseeOf(manager, quote.jobId);
    const gross = amountWords(quote.grossMinor, quote.currency);
    await this.outbox.addMail(manager, {
      kind: 'quote-approved',
      to: to.email,
      ...approvalMail({
        ...to,
        shopName: profile.name,
        quoteNumber: quote.number,
        gross,
        how,
        approvedBy: by,
        approvedAt: momentWords(at, this.config.timeZone),
        purchaseOrder,
        notToExceed: notToExceedMinor === null ? null : amountWords(notToExceedMinor, quote.currency),
        portalUrl: to.hasPortal ? `${this.config.publicUrl}/portal/jobs/${quote.jobId}` : null,
      }),
      jobId: quote.jobId,
      customerId: quote.customerId,
      dedupeKey: `quote-approved:${quote.id}`,
    });
    const order = purchaseOrder ? `, purchase order ${purchaseOrder}` : '';
    await this.history.record(manager, { actor, subject: { kind: 'quote', id: quote.id }, jobId: quote.jobId, event: 'quote.approved', words: `Quote ${quote.number} (${gross}) approved ${HOW[how]} by ${by}${order}.`, data: { revision: quote.revision, ...approval } });
  }
}
