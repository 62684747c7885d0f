import { z } from 'zod';
import { currencyField, dateField, idField, lineField, minorField, pageOf, pageQuery, versionField } from './fields.js';
import { moneyLineViewSchema, taxSummarySchema } from './quotes.js';

/** What an invoice owes is never stored twice: open, part paid or paid follows from its payments. */
export const INVOICE_STATES = ['open', 'part-paid', 'paid'] as const;
export const PAYMENT_KINDS = ['card', 'bank-transfer', 'cash'] as const;

export const issueInvoiceSchema = z.strictObject({ jobVersion: versionField, quoteId: idField });
export type IssueInvoice = z.infer<typeof issueInvoiceSchema>;

export const recordPaymentSchema = z.strictObject({
  version: versionField,
  kind: z.enum(['bank-transfer', 'cash']),
  amountMinor: minorField.refine((v) => v > 0, 'More than nothing.'),
  receivedOn: dateField,
  reference: lineField(80).default(''),
});
export type RecordPayment = z.infer<typeof recordPaymentSchema>;

export const paymentViewSchema = z.strictObject({ id: idField, kind: z.enum(PAYMENT_KINDS), amountMinor: z.number().int(), currency: currencyField, receivedAt: z.string(), reference: z.string(), recordedBy: z.string() });
export const invoiceViewSchema = z.strictObject({
  id: idField,
  number: z.string(),
  jobId: idField,
  jobNumber: z.string(),
  customerId: idField,
  customerName: z.string(),
  quoteNumber: z.string(),
  state: z.enum(INVOICE_STATES),
  currency: currencyField,
  lines: z.array(moneyLineViewSchema),
  taxSummary: taxSummarySchema,
  netMinor: z.number().int(),
  taxMinor: z.number().int(),
  grossMinor: z.number().int(),
  paidMinor: z.number().int(),
  balanceMinor: z.number().int(),
  issuedAt: z.string(),
  dueOn: z.string(),
  overdue: z.boolean(),
  payments: z.array(paymentViewSchema),
  paperId: idField.nullable(),
  version: versionField,
});
export type InvoiceView = z.infer<typeof invoiceViewSchema>;
export const invoiceRowSchema = z.strictObject({ id: idField, number: z.string(), jobId: idField, jobNumber: z.string(), customerName: z.string(), state: z.enum(INVOICE_STATES), currency: currencyField, grossMinor: z.number().int(), balanceMinor: z.number().int(), issuedAt: z.string(), dueOn: z.string(), overdue: z.boolean() });
export const invoicePageSchema = pageOf(invoiceRowSchema);
export const invoiceQuerySchema = z.strictObject({ ...pageQuery, state: z.enum([...INVOICE_STATES, 'overdue', 'all']).default('all'), q: lineField(80).optional() });
export type InvoiceQuery = z.infer<typeof invoiceQuerySchema>;

/** The portal's way to the payment page. */
export const checkoutSchema = z.strictObject({ version: versionField });
export type StartCheckout = z.infer<typeof checkoutSchema>;
export const checkoutStartedSchema = z.strictObject({ url: z.url() });
export const paymentReturnQuerySchema = z.strictObject({ session_id: z.string().regex(/^cs_[A-Za-z0-9_]{1,200}$/) });
export const paymentReturnSchema = z.strictObject({ invoice: invoiceViewSchema, outcome: z.enum(['paid', 'not-yet', 'not-paid']) });
export type PaymentReturn = z.infer<typeof paymentReturnSchema>;
