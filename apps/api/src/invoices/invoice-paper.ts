import type { InvoiceModel, JobPaperBase } from '@libs/documents';
import { shopDate } from '../clock/shop-date.js';
import { dayWords } from '../mail/day-words.js';
import type { InvoiceLineRow } from './invoice-line.entity.js';
import type { Invoice } from './invoice.entity.js';
import { termsWords, type PaymentTerms } from './invoice-terms.js';
import type { Quote } from '../quotes/quote.entity.js';
import { taxSummaryOf } from '../quotes/quote-sums.js';

const HOW = { portal: 'In the portal', phone: 'By phone', 'purchase-order': 'By purchase order' } as const;

export interface InvoiceForPaper {
  readonly invoice: Pick<Invoice, 'number' | 'currency' | 'netMinor' | 'taxMinor' | 'grossMinor' | 'dueOn'>;
  readonly lines: readonly Omit<InvoiceLineRow, 'id' | 'invoiceId'>[];
  readonly quote: Quote;
  readonly terms: PaymentTerms;
  readonly releasedAt: string | null;
  readonly bank: InvoiceModel['bank'];
  readonly payUrl: string | null;
}

/** The invoice as it is printed: what was approved, by whom, and how it is paid. */
export function invoicePaper(head: JobPaperBase, { invoice, lines, quote, terms, releasedAt, bank, payUrl }: InvoiceForPaper): InvoiceModel {
  const priced = lines.map(({ kind: _kind, position: _position, ...line }) => line);
  return {
    ...head,
    kind: 'invoice',
    quoteNumber: quote.revision === 1 ? quote.number : `${quote.number}, revision ${quote.revision}`,
    approval: quote.approvedHow && quote.approvedBy && quote.approvedAt ? `${HOW[quote.approvedHow]} by ${quote.approvedBy}, ${dayWords(shopDate(new Date(quote.approvedAt), head.timeZone))}` : '',
    purchaseOrder: quote.purchaseOrder,
    suppliedOn: releasedAt ? shopDate(new Date(releasedAt), head.timeZone) : null,
    dueOn: invoice.dueOn,
    terms: termsWords(terms),
    paymentReference: invoice.number,
    bank,
    payUrl,
    note: '',
    currency: invoice.currency,
    lines: priced,
    taxSummary: taxSummaryOf(lines as Parameters<typeof taxSummaryOf>[0]),
    netMinor: invoice.netMinor,
    taxMinor: invoice.taxMinor,
    grossMinor: invoice.grossMinor,
  };
}
