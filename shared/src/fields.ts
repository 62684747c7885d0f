import { z } from 'zod';

/** Pieces that messages are made of. */
const CONTROL = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]/;
/** Half a character: a database keeps another one in its place, and a hash over the text no longer fits. */
const HALF_CHARACTER = /\p{Surrogate}/u;
const tidy = (text: string) => !CONTROL.test(text) && !HALF_CHARACTER.test(text);

export const idField = z.string().regex(/^[0-9a-z-]{8,40}$/, 'Not an identifier of this shop.');
export const versionField = z.number().int().min(1);
export const lineField = (max: number) => z.string().trim().max(max, `At most ${max} characters.`).refine((s) => tidy(s) && !/[\r\n]/.test(s), 'Only one line of plain text.');
export const requiredLine = (max: number, words = 'Fill this in.') => lineField(max).refine((s) => s.length > 0, words);
export const textField = (max: number) => z.string().trim().max(max, `At most ${max} characters.`).refine(tidy, 'Only plain text.');
export const emailField = z.string().trim().toLowerCase().max(254).pipe(z.email('Not an e-mail address.'));
export const dateField = z.iso.date('A date like 2026-03-31.');
export const instantField = z.iso.datetime({ precision: 3 });
export const currencyField = z.string().regex(/^[A-Z]{3}$/, 'A currency like EUR.');
export const minorField = z.number().int().min(-999_999_999_99).max(999_999_999_99);
export const finite = (message: string) => z.number({ error: message }).refine(Number.isFinite, message);

/** What was typed, kept beside its SI value: path of the reading → text and unit as shown. */
export const enteredField = z.record(z.string().max(120), z.strictObject({ text: z.string().max(60), unit: z.string().max(20) })).default({});
export type Entered = z.infer<typeof enteredField>;

/** Lists: page, sort and filter travel as flat query keys. */
export const pageQuery = {
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  size: z.coerce.number().int().min(1).max(200).default(50),
};
export const pageOf = <T extends z.ZodType>(row: T) =>
  z.strictObject({ rows: z.array(row), total: z.number().int(), page: z.number().int(), size: z.number().int() });
