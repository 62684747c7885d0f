import { z } from 'zod';
import { emailField, idField, lineField, pageOf, pageQuery, requiredLine, versionField } from './fields.js';

export const PAYMENT_TERMS = ['prepayment', 'account'] as const;

export const customerDetails = {
  name: requiredLine(120, 'Whose machine is it?'),
  contactName: lineField(80).default(''),
  email: emailField,
  phone: lineField(40).default(''),
  addressLine1: lineField(120).default(''),
  addressLine2: lineField(120).default(''),
  postcode: lineField(20).default(''),
  city: lineField(80).default(''),
  country: z.string().regex(/^[A-Z]{2}$/, 'Two letters, like DE.').default('DE'),
  taxNumber: lineField(40).default(''),
};
export const createCustomerSchema = z.strictObject(customerDetails);
export type CreateCustomer = z.infer<typeof createCustomerSchema>;
export const updateCustomerSchema = z.strictObject({ ...customerDetails, version: versionField });
export type UpdateCustomer = z.infer<typeof updateCustomerSchema>;

export const customerTermsSchema = z.strictObject({
  version: versionField,
  terms: z.enum(PAYMENT_TERMS),
  netDays: z.number().int().min(0).max(180),
  creditStop: z.boolean(),
});
export type CustomerTerms = z.infer<typeof customerTermsSchema>;

export const customerViewSchema = z.strictObject({
  id: idField,
  name: z.string(),
  contactName: z.string(),
  email: z.string(),
  phone: z.string(),
  addressLine1: z.string(),
  addressLine2: z.string(),
  postcode: z.string(),
  city: z.string(),
  country: z.string(),
  taxNumber: z.string(),
  terms: z.enum(PAYMENT_TERMS),
  netDays: z.number().int(),
  creditStop: z.boolean(),
  version: versionField,
});
export type CustomerView = z.infer<typeof customerViewSchema>;

export const customerRowSchema = z.strictObject({ id: idField, name: z.string(), city: z.string(), email: z.string(), openJobs: z.number().int(), machines: z.number().int() });
export const customerPageSchema = pageOf(customerRowSchema);
export type CustomerPage = z.infer<typeof customerPageSchema>;
export const customerQuerySchema = z.strictObject({ ...pageQuery, q: lineField(80).optional() });
export type CustomerQuery = z.infer<typeof customerQuerySchema>;
