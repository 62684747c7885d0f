import type { Gate, JobState, Route, Step } from '@shared/route';

/** What the shop calls the steps, gates, routes and ends. */
const STEPS: Record<Step, string> = {
  received: 'Received',
  'incoming-test': 'Incoming test',
  dismantled: 'Dismantled',
  'core-test-before': 'Core test before',
  'awaiting-approval': 'Awaiting approval',
  'strip-and-burnout': 'Strip and burnout',
  'core-test-after': 'Core test after',
  rewind: 'Rewind',
  'before-varnish-test': 'Before-varnish test',
  treatment: 'Treatment',
  assembly: 'Assembly',
  'final-test': 'Final test',
  ready: 'Ready',
  released: 'Released',
};
const GATES: Record<Gate, string> = {
  'strip-may-start': 'Strip may start',
  'burnout-may-start': 'Burnout may start',
  'rewind-may-start': 'Rewind may start',
  'treatment-may-start': 'Treatment may start',
  ready: 'Ready',
  released: 'Released',
};
const ROUTES: Record<Route, string> = { rewind: 'Rewind', recondition: 'Recondition', 'core-test-only': 'Core test only', 'coil-rewind': 'Coil rewind' };
const STATES: Record<JobState, string> = {
  open: 'in work',
  'on-hold': 'on hold',
  released: 'released',
  'returned-unrepaired': 'returned unrepaired',
  replaced: 'replaced',
  scrapped: 'scrapped',
};
export const stepName = (step: Step): string => STEPS[step];
export const gateName = (gate: Gate): string => GATES[gate];
export const routeName = (route: Route): string => ROUTES[route];
export const stateName = (state: JobState): string => STATES[state];
