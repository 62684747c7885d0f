import { z } from 'zod';
import { emailField, idField, requiredLine } from './fields.js';
import { ALL_PERMISSIONS, ROLES, type Permission } from './roles.js';

export const signInSchema = z.strictObject({ email: emailField, password: z.string().min(1, 'Type your password.').max(256) });
export type SignIn = z.infer<typeof signInSchema>;

export const UNIT_SYSTEMS = ['si', 'inch-pound'] as const;
export const THEMES = ['system', 'light', 'dark'] as const;
export const preferencesSchema = z.strictObject({ units: z.enum(UNIT_SYSTEMS), theme: z.enum(THEMES) });
export type Preferences = z.infer<typeof preferencesSchema>;

export const shopSummarySchema = z.strictObject({
  name: z.string(),
  timeZone: z.string(),
  currency: z.string(),
  demo: z.boolean(),
  /** where the demo's mailbox can be looked at, when there is one */
  mailboxUrl: z.string().nullable(),
});

export const meSchema = z.strictObject({
  id: idField,
  name: z.string(),
  email: z.string(),
  roles: z.array(z.enum(ROLES)),
  permissions: z.array(z.enum(ALL_PERMISSIONS as [Permission, ...Permission[]])),
  customerId: idField.nullable(),
  preferences: preferencesSchema,
  shop: shopSummarySchema,
});
export type Me = z.infer<typeof meSchema>;

/** A signature is the person's own password typed at the moment of signing. */
export const signaturePassword = z.string().min(1, 'Type your password to sign.').max(256);

export const passwordField = z.string().min(12, 'At least 12 characters.').max(256, 'At most 256 characters.');

export const createUserSchema = z.strictObject({
  name: requiredLine(80),
  email: emailField,
  roles: z.array(z.enum(ROLES)).min(1, 'At least one role.').max(ROLES.length),
  customerId: idField.nullable(),
  password: passwordField,
});
export type CreateUser = z.infer<typeof createUserSchema>;

export const updateUserSchema = z.strictObject({
  version: z.number().int().min(1),
  name: requiredLine(80),
  roles: z.array(z.enum(ROLES)).min(1, 'At least one role.').max(ROLES.length),
  disabled: z.boolean(),
});
export type UpdateUser = z.infer<typeof updateUserSchema>;

export const userViewSchema = z.strictObject({
  id: idField,
  name: z.string(),
  email: z.string(),
  roles: z.array(z.enum(ROLES)),
  customerId: idField.nullable(),
  customerName: z.string().nullable(),
  disabled: z.boolean(),
  version: z.number().int(),
});
export type UserView = z.infer<typeof userViewSchema>;
