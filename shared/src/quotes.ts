import { z } from 'zod';
import { currencyField, dateField, idField, lineField, minorField, requiredLine, textField, versionField } from './fields.js';

export const QUOTE_STATES = ['draft', 'sent', 'approved', 'declined', 'superseded'] as const;
export type QuoteState = (typeof QUOTE_STATES)[number];
export const LINE_KINDS = ['labour', 'material', 'outside-work', 'test', 'other'] as const;

export const quoteLineSchema = z.strictObject({
  kind: z.enum(LINE_KINDS),
  description: requiredLine(200, 'Say what this line is for.'),
  quantityThousandths: z.number().int().min(1, 'More than nothing.').max(1_000_000_000),
  unit: lineField(10).default(''),
  unitPriceMinor: minorField.refine((v) => v >= 0, 'A price is not negative; give a discount instead.'),
  taxRateBasisPoints: z.number().int().min(0).max(10_000),
});
export type QuoteLine = z.infer<typeof quoteLineSchema>;

export const saveQuoteSchema = z.strictObject({
  lines: z.array(quoteLineSchema).min(1, 'A quote needs a line.').max(200),
  validUntil: dateField,
  note: textField(1000).default(''),
});
export const createQuoteSchema = saveQuoteSchema;
export type CreateQuote = z.infer<typeof createQuoteSchema>;
export const updateQuoteSchema = saveQuoteSchema.extend({ version: versionField });
export type UpdateQuote = z.infer<typeof updateQuoteSchema>;

/** Sending, revising: only the version counts. */
export const versionOnlySchema = z.strictObject({ version: versionField });
export type VersionOnly = z.infer<typeof versionOnlySchema>;

/** Approval by phone: name, time and limit. By purchase order: its number. */
export const approveForCustomerSchema = z.strictObject({
  version: versionField,
  how: z.enum(['phone', 'purchase-order']),
  approvedBy: requiredLine(80, 'Who approved it?'),
  approvedAt: z.iso.datetime({ offset: true }),
  purchaseOrder: lineField(60).default(''),
  notToExceedMinor: minorField.refine((v) => v > 0, 'More than nothing.').nullable(),
});
export type ApproveForCustomer = z.infer<typeof approveForCustomerSchema>;

export const approveInPortalSchema = z.strictObject({ version: versionField, name: requiredLine(80, 'Type your name.'), purchaseOrder: lineField(60).default('') });
export type ApproveInPortal = z.infer<typeof approveInPortalSchema>;
export const declineQuoteSchema = z.strictObject({ version: versionField, reason: requiredLine(400, 'A word on why helps the shop.') });
export type DeclineQuote = z.infer<typeof declineQuoteSchema>;

export const moneyLineViewSchema = z.strictObject({
  kind: z.enum(LINE_KINDS),
  description: z.string(),
  quantityThousandths: z.number().int(),
  unit: z.string(),
  unitPriceMinor: z.number().int(),
  taxRateBasisPoints: z.number().int(),
  netMinor: z.number().int(),
  taxMinor: z.number().int(),
});
export const taxSummarySchema = z.array(z.strictObject({ taxRateBasisPoints: z.number().int(), netMinor: z.number().int(), taxMinor: z.number().int() }));

export const quoteViewSchema = z.strictObject({
  id: idField,
  jobId: idField,
  jobNumber: z.string(),
  customerId: idField,
  customerName: z.string(),
  number: z.string(),
  revision: z.number().int(),
  state: z.enum(QUOTE_STATES),
  currency: currencyField,
  lines: z.array(moneyLineViewSchema),
  taxSummary: taxSummarySchema,
  netMinor: z.number().int(),
  taxMinor: z.number().int(),
  grossMinor: z.number().int(),
  validUntil: z.string(),
  expired: z.boolean(),
  note: z.string(),
  sentAt: z.string().nullable(),
  approval: z
    .strictObject({ how: z.enum(['portal', 'phone', 'purchase-order']), by: z.string(), at: z.string(), purchaseOrder: z.string(), notToExceedMinor: z.number().int().nullable() })
    .nullable(),
  declineReason: z.string().nullable(),
  version: versionField,
});
export type QuoteView = z.infer<typeof quoteViewSchema>;
export const quoteRowSchema = z.strictObject({ id: idField, number: z.string(), revision: z.number().int(), jobId: idField, jobNumber: z.string(), customerName: z.string(), state: z.enum(QUOTE_STATES), currency: currencyField, grossMinor: z.number().int(), validUntil: z.string() });
