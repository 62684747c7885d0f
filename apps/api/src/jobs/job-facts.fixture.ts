import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import { DEFAULT_BURNOUT_LIMITS } from '@shared/limits';
import type { RecordKind } from '@shared/records';
import type { Route, Step } from '@shared/route';
import type { JobFacts, RecordFact, SignOffFact } from './job-facts.js';

/** Facts for the specs of the gates: a job at a step, and what was recorded and signed, in the order given. */
export function factsAt(route: Route, step: Step, more: Partial<JobFacts> = {}): JobFacts {
  return {
    route,
    step,
    state: 'open',
    limits: { core: DEFAULT_CORE_LIMITS, machine: DEFAULT_MACHINE_TEST_LIMITS, burnout: DEFAULT_BURNOUT_LIMITS },
    records: [],
    signOffs: [],
    quotes: [],
    certificateInForce: false,
    invoices: [],
    customer: { terms: 'account', creditStop: false },
    onePersonMayRelease: false,
    ...more,
  };
}

/** A record; `id` is its moment: a later one is larger. */
export const record = (kind: RecordKind, id: string, more: Partial<RecordFact> = {}): RecordFact => ({
  id,
  kind,
  ordinal: 1,
  revision: 1,
  verdict: null,
  readings: {},
  result: {},
  contentHash: `hash of ${id}`,
  byUserId: 'technician',
  overdueInstruments: [],
  ...more,
});

/** A signature under a record, for the revision it is at. */
export const signed = (kind: SignOffFact['kind'], under: RecordFact | null, more: Partial<SignOffFact> = {}): SignOffFact => ({
  id: `${kind}-${under?.id ?? 'job'}`,
  kind,
  recordId: under?.id ?? null,
  refersTo: null,
  byUserId: 'manager',
  byName: 'Manager',
  byRoles: 'manager',
  at: '2026-03-02T09:00:00.000Z',
  reason: '',
  contentHash: under?.contentHash ?? 'hash of the words',
  detail: {},
  version: 1,
  ...more,
});
