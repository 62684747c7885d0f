import { z } from 'zod';
import { idField } from './fields.js';

/** What was promised to leave the house after a commit. */
export const outboxRowSchema = z.strictObject({ id: idField, kind: z.string(), to: z.string(), subject: z.string(), state: z.enum(['waiting', 'sent', 'given-up']), attempts: z.number().int(), createdAt: z.string(), sentAt: z.string().nullable(), lastError: z.string().nullable() });
export const outboxListSchema = z.array(outboxRowSchema);
