import { Injectable, Logger } from '@nestjs/common';
import type { InvoiceView, RecordPayment } from '@shared/invoices';
import type { Actor } from '../auth/actor.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Invoice } from '../invoices/invoice.entity.js';
import { InvoicesService } from '../invoices/invoices.service.js';
import { amountWords } from '../mail/amount-words.js';
import { CheckoutService } from './checkout.service.js';
import { PaymentBookService } from './payment-book.service.js';

/** Money that reached the shop without the payment service: the office writes it down. */
@Injectable()
export class RecordedPaymentsService {
  private readonly log = new Logger('RecordedPayments');

  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly invoices: InvoicesService,
    private readonly book: PaymentBookService,
    private readonly checkout: CheckoutService,
  ) {}

  async record(actor: Actor, invoiceId: string, input: RecordPayment): Promise<InvoiceView> {
    if (input.receivedOn > this.invoices.today()) {
      const message = 'This day has not come yet.';
      throw new AppError('INPUT_NOT_VALID', message, { fields: [{ path: 'receivedOn', code: 'future', message }] });
    }
    await this.unitOfWork.run(async (manager) => {
      const invoice = await manager.findOneBy(Invoice, { id: invoiceId });
      if (!invoice) throw notFound('invoice');
      const balance = invoice.grossMinor - (await this.book.paidMinor(manager, invoiceId));
      if (balance <= 0) throw new AppError('ALREADY_DONE', `Invoice ${invoice.number} is paid already.`);
      if (invoice.version !== input.version) throw changedMeanwhile('invoice', await this.invoices.viewIn(manager, invoiceId));
      if (input.amountMinor > balance) {
        const message = `${amountWords(input.amountMinor, invoice.currency)} is more than the invoice still asks for (${amountWords(balance, invoice.currency)}). Record what belongs to this invoice and settle the rest with the customer.`;
        throw new AppError('AMOUNT_NOT_RIGHT', message, { fields: [{ path: 'amountMinor', code: 'too-much', message }] });
      }
      await this.book.write(manager, { invoiceId, kind: input.kind, amountMinor: input.amountMinor, receivedAt: input.receivedOn, reference: input.reference, paymentIntentId: null, actor });
    });
    // the customer may have the payment page open for the old amount; the minute's look-round tries again
    void this.checkout.closeStalePages(invoiceId).catch((error: unknown) => this.log.warn(`An open payment page could not be closed: ${error instanceof Error ? error.message : String(error)}`));
    return this.invoices.one(invoiceId);
  }
}
