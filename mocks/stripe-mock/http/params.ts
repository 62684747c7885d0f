import { z } from 'zod';
import { ApiError, type ErrorBody } from './api-error.js';
import type { FormObject } from './form-body.js';

const refuse = (code: string | undefined, message: string) => ({ code: 'custom' as const, params: { code }, message });

/** Parameters as they stand in a form: everything is text until its meaning is known. */
export const text = (max = 5000) =>
  z.string().superRefine((value, context) => {
    if (value === '') context.addIssue(refuse('parameter_invalid_empty', 'You passed an empty string. Leave the parameter out, or unset it where it can be unset.'));
    if (value.length > max) context.addIssue(refuse(undefined, `Invalid string: must be at most ${max} characters`));
  });
/** Text that an empty value unsets. */
export const clearableText = (max = 5000) => z.string().max(max);
export const whole = () =>
  z.string().transform((value, context) => {
    if (/^-?\d{1,15}$/.test(value)) return Number(value);
    context.addIssue(refuse('parameter_invalid_integer', `Invalid integer: ${value}`));
    return z.NEVER;
  });
export const positive = () =>
  whole().superRefine((value, context) => {
    if (value < 1) context.addIssue(refuse('parameter_invalid_integer', 'Invalid positive integer'));
  });
export const notNegative = () =>
  whole().superRefine((value, context) => {
    if (value < 0) context.addIssue(refuse('parameter_invalid_integer', 'Invalid non-negative integer'));
  });
export const yesNo = () => z.enum(['true', 'false']).transform((value) => value === 'true');
export const webAddress = () =>
  text(5000).superRefine((value, context) => {
    if (!/^https?:\/\//.test(value) || !URL.canParse(value)) context.addIssue(refuse('url_invalid', 'Not a valid URL'));
  });
export const email = () =>
  text(512).superRefine((value, context) => {
    if (!/^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(value)) context.addIssue(refuse('email_invalid', `Invalid email address: ${value}`));
  });
export const currency = () =>
  z.string().transform((value, context) => {
    const lower = value.toLowerCase();
    if (Intl.supportedValuesOf('currency').includes(lower.toUpperCase())) return lower;
    context.addIssue(refuse(undefined, `Invalid currency: ${value}`));
    return z.NEVER;
  });

/** Up to 50 keys of up to 40 characters without brackets, values up to 500; an empty value takes a key away. */
export const metadata = () =>
  z.union([z.literal(''), z.record(z.string(), z.string())]).superRefine((value, context) => {
    if (value === '') return;
    const entries = Object.entries(value);
    if (entries.length > 50) context.addIssue(refuse(undefined, 'You can have up to 50 metadata keys.'));
    for (const [key, item] of entries) {
      if (key.length > 40 || /[[\]]/.test(key)) context.addIssue(refuse(undefined, `Metadata keys must have at most 40 characters and no square brackets: ${key.slice(0, 60)}`));
      if (item.length > 500) context.addIssue(refuse(undefined, `Metadata values must have at most 500 characters: ${key}`));
    }
  });

export const created = () =>
  z.union([whole(), z.strictObject({ gt: whole(), gte: whole(), lt: whole(), lte: whole() }).partial()]).optional();
export const onList = {
  limit: whole()
    .superRefine((value, context) => {
      if (value < 1 || value > 100) context.addIssue(refuse(undefined, 'Invalid limit: must be between 1 and 100'));
    })
    .optional(),
  starting_after: text().optional(),
  ending_before: text().optional(),
};

/** Read the form by its schema, or throw the service's own error about the first thing that is wrong with it. */
export function parseParams<S extends z.ZodType>(schema: S, form: FormObject): z.output<S> {
  const result = schema.safeParse(form);
  if (result.success) return result.data;
  const unknown = result.error.issues.find((issue) => issue.code === 'unrecognized_keys');
  throw new ApiError(400, errorOf(unknown ?? result.error.issues[0], form), false);
}

function errorOf(issue: z.core.$ZodIssue | undefined, form: FormObject): ErrorBody {
  if (!issue) return { type: 'invalid_request_error', message: 'Invalid request' };
  const param = bracketed(issue.path);
  const say = (code: string | undefined, message: string, name = param): ErrorBody => ({
    type: 'invalid_request_error',
    message,
    ...(code ? { code } : {}),
    ...(name ? { param: name } : {}),
  });
  if (issue.code === 'unrecognized_keys') {
    const name = bracketed([...issue.path, issue.keys[0] ?? '']);
    return say('parameter_unknown', `Received unknown parameter: ${name}`, name);
  }
  if (valueAt(form, issue.path) === undefined) return say('parameter_missing', `Missing required param: ${param}.`);
  if (issue.code === 'invalid_value') return say(undefined, `Invalid ${param}: must be one of ${issue.values.join(', ')}`);
  if (issue.code === 'custom') return say(typeof issue.params?.['code'] === 'string' ? issue.params['code'] : undefined, issue.message);
  if (issue.code === 'invalid_type') return say(undefined, `Invalid ${issue.expected === 'array' ? 'array' : issue.expected === 'string' ? 'string' : 'object'}`);
  return say(undefined, `Invalid ${param}`);
}

function bracketed(path: readonly PropertyKey[]): string {
  return path.map((part, at) => (at === 0 ? String(part) : `[${String(part)}]`)).join('');
}

function valueAt(form: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>((here, key) => (typeof here === 'object' && here !== null ? Reflect.get(here, key) : undefined), form);
}
