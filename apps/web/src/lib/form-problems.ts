import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import type { z } from 'zod';
import { ApiError } from './http.js';
import { defineText } from './text.js';
import type { FormProblem } from './typed.js';

const t = defineText({ choose: 'Choose one.', fill: 'Fill this in.' });

/** A contract without words of its own for a gap speaks of types; a person is asked for the thing. */
function wordsOf({ code, message }: z.core.$ZodIssue): string {
  if (code === 'invalid_value' && message.startsWith('Invalid option')) return t('choose');
  if (code === 'invalid_union' && message.startsWith('Invalid')) return t('choose');
  if (code === 'invalid_type' && message.startsWith('Invalid input')) return t('fill');
  return message;
}

/** What a contract finds wrong, as problems at their fields. */
export const problemsOf = (error: z.ZodError): FormProblem[] => error.issues.map((issue) => ({ path: issue.path.join('.'), message: wordsOf(issue) }));

/** Puts problems at their fields and the cursor into the first one. */
export function showProblems<F extends FieldValues>(problems: readonly FormProblem[], setError: UseFormSetError<F>): void {
  const seen = new Set<string>();
  for (const { path, message } of problems) {
    if (seen.has(path)) continue;
    setError(path as Path<F>, { type: 'server', message }, { shouldFocus: seen.size === 0 });
    seen.add(path);
  }
}

/** The server's own field errors, at the same fields. */
export function showServerProblems<F extends FieldValues>(error: unknown, setError: UseFormSetError<F>): void {
  if (error instanceof ApiError) showProblems(error.fields, setError);
}

/** A filled form held against its contract before it is sent; null when something is wrong, and then said at its field. */
export function checked<S extends z.ZodType, F extends FieldValues>(schema: S, candidate: unknown, setError: UseFormSetError<F>): z.infer<S> | null {
  const result = schema.safeParse(candidate);
  if (result.success) return result.data;
  showProblems(problemsOf(result.error), setError);
  return null;
}
