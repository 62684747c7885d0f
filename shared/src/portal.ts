import { z } from 'zod';
import { idField } from './fields.js';
import { invoiceRowSchema } from './invoices.js';
import { quoteRowSchema } from './quotes.js';
import { JOB_STATES, ROUTES, STEPS } from './route.js';

/** What a customer sees of a job: their own words and papers, nothing of costs or internal notes. */
export const portalJobRowSchema = z.strictObject({
  id: idField,
  number: z.string(),
  machine: z.string(),
  route: z.enum(ROUTES),
  step: z.enum(STEPS),
  state: z.enum(JOB_STATES),
  promisedOn: z.string().nullable(),
  receivedAt: z.string(),
});
export const portalHomeSchema = z.strictObject({
  customerName: z.string(),
  quotesToAnswer: z.array(quoteRowSchema),
  invoicesToPay: z.array(invoiceRowSchema),
  jobs: z.array(portalJobRowSchema),
});
export type PortalHome = z.infer<typeof portalHomeSchema>;

export const corePairSchema = z.strictObject({
  before: z.strictObject({ wattsPerKg: z.number(), expandedUncertainty: z.number(), fluxDensityT: z.number() }).nullable(),
  after: z.strictObject({ wattsPerKg: z.number(), expandedUncertainty: z.number(), fluxDensityT: z.number() }).nullable(),
  increase: z.strictObject({ fraction: z.number(), expandedUncertainty: z.number(), limitFraction: z.number() }).nullable(),
  verdict: z.string().nullable(),
  established: z.boolean(),
});
export type CorePair = z.infer<typeof corePairSchema>;

export const portalJobSchema = portalJobRowSchema.extend({
  complaint: z.string(),
  quotes: z.array(quoteRowSchema),
  invoices: z.array(invoiceRowSchema),
  papers: z.array(z.strictObject({ id: idField, kind: z.string(), number: z.string(), issuedAt: z.string(), supersededBy: z.string().nullable() })),
  photos: z.array(z.strictObject({ id: idField, name: z.string(), mime: z.string() })),
  core: corePairSchema.nullable(),
});
export type PortalJob = z.infer<typeof portalJobSchema>;
export const portalMachineSchema = z.strictObject({ id: idField, description: z.string(), serial: z.string(), visits: z.array(z.strictObject({ jobId: idField, jobNumber: z.string(), receivedAt: z.string(), wattsPerKgBefore: z.number().nullable(), wattsPerKgAfter: z.number().nullable() })) });
export const portalMachinesSchema = z.array(portalMachineSchema);
