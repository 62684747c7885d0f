import type { ErrorCode, FieldProblem, GateCondition } from '@shared/errors';

export interface ErrorDetails {
  readonly fields?: readonly FieldProblem[];
  readonly current?: unknown;
  readonly conditions?: readonly GateCondition[];
  readonly cause?: unknown;
}

/** A refusal the person can act on: a code, words, and what they need to go on. */
export class AppError extends Error {
  constructor(
    readonly code: ErrorCode,
    words: string,
    readonly details: ErrorDetails = {},
  ) {
    super(words, { cause: details.cause });
  }
}

export const notFound = (what: string) => new AppError('NOT_FOUND', `There is no such ${what}.`);

export const changedMeanwhile = (what: string, current: unknown) =>
  new AppError('CHANGED_MEANWHILE', `Somebody else changed this ${what} meanwhile. Both versions are shown; nothing you typed is lost.`, { current });
