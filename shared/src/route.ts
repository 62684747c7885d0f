/** The routes of a job, its steps and the gates between them. Words of the trade; labels stand in the text catalogue. */
export const ROUTES = ['rewind', 'recondition', 'core-test-only', 'coil-rewind'] as const;
export type Route = (typeof ROUTES)[number];

export const STEPS = [
  'received',
  'incoming-test',
  'dismantled',
  'core-test-before',
  'awaiting-approval',
  'strip-and-burnout',
  'core-test-after',
  'rewind',
  'before-varnish-test',
  'treatment',
  'assembly',
  'final-test',
  'ready',
  'released',
] as const;
export type Step = (typeof STEPS)[number];

export const ROUTE_STEPS: Record<Route, readonly Step[]> = {
  rewind: STEPS,
  recondition: ['received', 'incoming-test', 'dismantled', 'awaiting-approval', 'treatment', 'assembly', 'final-test', 'ready', 'released'],
  'core-test-only': ['received', 'core-test-before', 'ready', 'released'],
  'coil-rewind': ['received', 'incoming-test', 'awaiting-approval', 'rewind', 'treatment', 'final-test', 'ready', 'released'],
};

/** A job is open, on hold, or at one of its ends. */
export const JOB_STATES = ['open', 'on-hold', 'released', 'returned-unrepaired', 'replaced', 'scrapped'] as const;
export type JobState = (typeof JOB_STATES)[number];

/** A gate stands in front of the step it is named after. */
export const GATES = ['strip-may-start', 'burnout-may-start', 'rewind-may-start', 'treatment-may-start', 'ready', 'released'] as const;
export type Gate = (typeof GATES)[number];

export const GATE_BEFORE: Partial<Record<Step, Gate>> = {
  'strip-and-burnout': 'strip-may-start',
  rewind: 'rewind-may-start',
  treatment: 'treatment-may-start',
  ready: 'ready',
  released: 'released',
};

export function nextStep(route: Route, step: Step): Step | null {
  const steps = ROUTE_STEPS[route];
  return steps[steps.indexOf(step) + 1] ?? null;
}

export function stepIndex(route: Route, step: Step): number {
  return ROUTE_STEPS[route].indexOf(step);
}

/** Where a job has come to may be recorded, what lies ahead may not. */
export function hasReached(route: Route, at: Step, step: Step): boolean {
  const there = stepIndex(route, step);
  return there >= 0 && stepIndex(route, at) >= there;
}
