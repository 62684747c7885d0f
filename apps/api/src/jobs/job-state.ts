import { ROUTE_STEPS, stepIndex, type JobState, type Route, type Step } from '@shared/route';
import { gateIsOpen } from './gates.js';
import type { GateCondition } from '@shared/errors';

export interface JobPosition {
  readonly route: Route;
  readonly step: Step;
  readonly state: JobState;
}

export type MoveProblem =
  | { readonly code: 'ended' }
  | { readonly code: 'on-hold' }
  | { readonly code: 'not-on-route' }
  | { readonly code: 'same-step' }
  | { readonly code: 'skips-steps' }
  | { readonly code: 'reason-missing' }
  | { readonly code: 'gate-shut'; readonly conditions: readonly GateCondition[] };

/** Which moves exist: one step forward through what stands before it, or back with a reason. */
export function moveProblem(job: JobPosition, to: Step, why: string, conditionsBefore: (step: Step) => readonly GateCondition[]): MoveProblem | null {
  if (job.state === 'on-hold') return { code: 'on-hold' };
  if (job.state !== 'open') return { code: 'ended' };
  const from = stepIndex(job.route, job.step);
  const target = stepIndex(job.route, to);
  if (target < 0) return { code: 'not-on-route' };
  if (target === from) return { code: 'same-step' };
  if (target < from) return why.trim() === '' ? { code: 'reason-missing' } : null;
  if (target > from + 1) return { code: 'skips-steps' };
  const conditions = conditionsBefore(to);
  return gateIsOpen(conditions) ? null : { code: 'gate-shut', conditions };
}

/** The state a job is in once it stands at a step: the last one ends it. */
export function stateAt(route: Route, step: Step): JobState {
  return step === ROUTE_STEPS[route].at(-1) ? 'released' : 'open';
}

export const isEnded = (state: JobState): boolean => state !== 'open' && state !== 'on-hold';
