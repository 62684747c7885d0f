import type { QuoteLine, QuoteState, QuoteView } from '@shared/quotes';
import { taxSummaryOf } from './quote-sums.js';
import { isExpired } from './quote-state.js';

export interface QuoteRow {
  id: string;
  jobId: string;
  jobNumber: string;
  customerId: string;
  customerName: string;
  number: string;
  revision: number;
  state: QuoteState;
  currency: string;
  netMinor: number;
  taxMinor: number;
  grossMinor: number;
  validUntil: string;
  note: string;
  sentAt: string | null;
  approvedHow: 'portal' | 'phone' | 'purchase-order' | null;
  approvedBy: string | null;
  approvedAt: string | null;
  purchaseOrder: string;
  notToExceedMinor: number | null;
  declineReason: string | null;
  version: number;
  lines: string;
}

/** One statement a quote, its lines included; a WHERE on `q` follows. */
export const QUOTE_SELECT = `SELECT q.id, q.jobId, j.number AS jobNumber, q.customerId, c.name AS customerName, q.number, q.revision, q.state, q.currency,
    q.netMinor, q.taxMinor, q.grossMinor, q.validUntil, q.note, q.sentAt, q.approvedHow, q.approvedBy, q.approvedAt, q.purchaseOrder, q.notToExceedMinor,
    q.declineReason, q.version,
    (SELECT json_group_array(json_object('kind', l.kind, 'description', l.description, 'quantityThousandths', l.quantityThousandths, 'unit', l.unit,
       'unitPriceMinor', l.unitPriceMinor, 'taxRateBasisPoints', l.taxRateBasisPoints, 'netMinor', l.netMinor, 'taxMinor', l.taxMinor) ORDER BY l.position)
     FROM quote_lines l WHERE l.quoteId = q.id) AS lines
  FROM quotes q JOIN jobs j ON j.id = q.jobId JOIN customers c ON c.id = q.customerId`;

/** A quote in a list; a WHERE on `q` follows. */
export const QUOTE_ROW_SELECT = `SELECT q.id, q.number, q.revision, q.jobId, j.number AS jobNumber, c.name AS customerName, q.state, q.currency, q.grossMinor, q.validUntil
  FROM quotes q JOIN jobs j ON j.id = q.jobId JOIN customers c ON c.id = q.customerId`;

export type MoneyLineView = QuoteLine & { netMinor: number; taxMinor: number };

/** As its customer sees it: what they said on the phone it may cost at most is for the shop to know. */
export const quoteForCustomer = (view: QuoteView): QuoteView => (view.approval ? { ...view, approval: { ...view.approval, notToExceedMinor: null } } : view);

export function toQuoteView(row: QuoteRow, today: string): QuoteView {
  const { lines: json, approvedHow, approvedBy, approvedAt, purchaseOrder, notToExceedMinor, ...rest } = row;
  const lines = JSON.parse(json) as MoneyLineView[];
  return {
    ...rest,
    lines,
    taxSummary: [...taxSummaryOf(lines)],
    // an answered quote does not expire any more
    expired: (row.state === 'draft' || row.state === 'sent') && isExpired(row.validUntil, today),
    approval: approvedHow && approvedBy && approvedAt ? { how: approvedHow, by: approvedBy, at: approvedAt, purchaseOrder, notToExceedMinor } : null,
  };
}
