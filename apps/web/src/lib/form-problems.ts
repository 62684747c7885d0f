import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import type { z } from 'zod';
import { ApiError } from './http.js';
import type { FormProblem } from './typed.js';

/** What a contract finds wrong, as problems at their fields. */
export const problemsOf = (error: z.ZodError): FormProblem[] => error.issues.map((issue) => ({ path: issue.path.join('.'), message: issue.message }));

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
