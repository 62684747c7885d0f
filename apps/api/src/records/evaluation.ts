import type { FieldProblem } from '@shared/errors';
import type { Nameplate } from '@shared/machines';
import type { JobFacts } from '../jobs/job-facts.js';

/** What follows from a record's readings: computed here, by the same libraries the screen uses, and only this is kept. */
export interface Evaluation {
  readonly problems: readonly FieldProblem[];
  readonly verdict: string | null;
  readonly result: Record<string, unknown>;
  readonly calculation: string;
  readonly wattsPerKg: number | null;
  readonly increase: number | null;
}

export interface MachineFacts {
  readonly nameplate: Nameplate;
}

export interface EvaluationContext {
  readonly facts: JobFacts;
  readonly machine: MachineFacts;
  /** tags of instruments past their grace on the day */
  readonly instrumentsPastGrace: readonly string[];
}

/** A record that is only written down: nothing follows from it. */
export const NOTHING_FOLLOWS: Evaluation = { problems: [], verdict: null, result: {}, calculation: 'none', wattsPerKg: null, increase: null };
export const refusedFor = (problems: readonly FieldProblem[]): Evaluation => ({ ...NOTHING_FOLLOWS, problems });
