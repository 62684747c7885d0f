import { z } from 'zod';
import { idField, lineField, versionField } from './fields.js';

export const PAPER_KINDS = ['acknowledgement', 'tag', 'quote', 'invoice', 'receipt', 'certificate', 'delivery-note'] as const;
export type PaperKind = (typeof PAPER_KINDS)[number];

export const issueCertificateSchema = z.strictObject({ jobVersion: versionField, paperSize: z.enum(['A4', 'Letter']).default('A4'), units: z.enum(['si', 'inch-pound']).default('si'), reason: lineField(400).default('') });
export type IssueCertificate = z.infer<typeof issueCertificateSchema>;
export const paperViewSchema = z.strictObject({ id: idField, kind: z.enum(PAPER_KINDS), number: z.string(), issuedAt: z.string(), sha256: z.string().nullable(), verificationCode: z.string().nullable(), supersededBy: z.string().nullable() });
export type PaperView = z.infer<typeof paperViewSchema>;

/** The public check page: only what is needed to know that a certificate is ours and in force. */
export const certificateCheckSchema = z.strictObject({
  known: z.boolean(),
  number: z.string().nullable(),
  issuedOn: z.string().nullable(),
  shop: z.string().nullable(),
  machine: z.string().nullable(),
  coreVerdict: z.string().nullable(),
  supersededBy: z.string().nullable(),
});
