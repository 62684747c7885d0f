import type { JobPaperBase, QuoteModel } from '@libs/documents';
import type { QuoteView } from '@shared/quotes';

/** The quote's paper is known by number and revision; the paper of a revision takes the place of the one before. */
export const quotePaperNumber = (quote: { number: string; revision: number }): string => (quote.revision === 1 ? quote.number : `${quote.number}-r${quote.revision}`);

export const quotePaper = (head: JobPaperBase, quote: QuoteView, answerUrl: string | null): QuoteModel => ({
  ...head,
  kind: 'quote',
  revision: quote.revision,
  validUntil: quote.validUntil,
  note: quote.note,
  answerUrl,
  currency: quote.currency,
  lines: quote.lines.map(({ kind: _kind, ...line }) => line),
  taxSummary: quote.taxSummary,
  netMinor: quote.netMinor,
  taxMinor: quote.taxMinor,
  grossMinor: quote.grossMinor,
});
