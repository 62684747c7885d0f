import type { InvoiceView, invoiceRowSchema } from '@shared/invoices';
import type { z } from 'zod';
import { taxSummaryOf } from '../quotes/quote-sums.js';
import type { MoneyLineView } from '../quotes/quote-view.js';

export type InvoiceListRow = z.infer<typeof invoiceRowSchema>;

/** What an invoice owes is never stored: it follows from its payments, in every statement that asks. */
const STANDING = `SELECT s.*, s.grossMinor - s.paidMinor AS balanceMinor,
    CASE WHEN s.paidMinor >= s.grossMinor THEN 'paid' WHEN s.paidMinor > 0 THEN 'part-paid' ELSE 'open' END AS state
  FROM (SELECT i.*, COALESCE((SELECT SUM(p.amountMinor) FROM payments p WHERE p.invoiceId = i.id), 0) AS paidMinor FROM invoices i) s`;

const WITH_NAMES = `(SELECT i.*, j.number AS jobNumber, c.name AS customerName, q.number AS quoteNumber
  FROM (${STANDING}) i JOIN jobs j ON j.id = i.jobId JOIN customers c ON c.id = i.customerId JOIN quotes q ON q.id = i.quoteId) i`;

/** An invoice in a list; takes `:today`, a WHERE on `i` follows. */
export const INVOICE_ROW_SELECT = `SELECT i.id, i.number, i.jobId, i.jobNumber, i.customerName, i.state, i.currency, i.grossMinor, i.balanceMinor, i.issuedAt, i.dueOn,
    (i.balanceMinor > 0 AND i.dueOn < :today) AS overdue FROM ${WITH_NAMES}`;
export const INVOICE_COUNT = `SELECT COUNT(*) AS total FROM ${WITH_NAMES}`;

/** One statement an invoice, its lines and payments included; takes `:today`, a WHERE on `i` follows. */
export const INVOICE_SELECT = `SELECT i.id, i.number, i.jobId, i.jobNumber, i.customerId, i.customerName, i.quoteNumber, i.state, i.currency, i.netMinor, i.taxMinor, i.grossMinor,
    i.paidMinor, i.balanceMinor, i.issuedAt, i.dueOn, (i.balanceMinor > 0 AND i.dueOn < :today) AS overdue, i.paperId, i.version,
    (SELECT json_group_array(json_object('kind', l.kind, 'description', l.description, 'quantityThousandths', l.quantityThousandths, 'unit', l.unit,
       'unitPriceMinor', l.unitPriceMinor, 'taxRateBasisPoints', l.taxRateBasisPoints, 'netMinor', l.netMinor, 'taxMinor', l.taxMinor) ORDER BY l.position)
     FROM invoice_lines l WHERE l.invoiceId = i.id) AS lines,
    (SELECT json_group_array(json_object('id', p.id, 'kind', p.kind, 'amountMinor', p.amountMinor, 'currency', p.currency, 'receivedAt', p.receivedAt,
       'reference', p.reference, 'recordedBy', p.recordedByName) ORDER BY p.id)
     FROM payments p WHERE p.invoiceId = i.id) AS payments
  FROM ${WITH_NAMES}`;

export type InvoiceRow = Omit<InvoiceView, 'lines' | 'payments' | 'overdue' | 'taxSummary'> & { lines: string; payments: string; overdue: number };

export function toInvoiceView(row: InvoiceRow): InvoiceView {
  const lines = JSON.parse(row.lines) as MoneyLineView[];
  return { ...row, overdue: row.overdue === 1, lines, taxSummary: [...taxSummaryOf(lines)], payments: JSON.parse(row.payments) as InvoiceView['payments'] };
}

/** As its customer sees it: who of the shop wrote a transfer or cash down is the shop's own. */
export const invoiceForCustomer = (view: InvoiceView): InvoiceView => ({ ...view, payments: view.payments.map((payment) => ({ ...payment, recordedBy: payment.kind === 'card' ? payment.recordedBy : '' })) });

export const toInvoiceListRow = (row: Omit<InvoiceListRow, 'overdue'> & { overdue: number }): InvoiceListRow => ({ ...row, overdue: row.overdue === 1 });
