import type { RecordKind } from '@shared/records';
import type { SignOffKind } from '../src/sign-offs/sign-off.entity.js';
import { DEFAULT_LIMITS } from '../src/acceptance/default-limits.js';
import type { JobFacts, RecordFact, SignOffFact } from '../src/jobs/job-facts.js';

let made = 0;
/** Identifiers sort by the time they were made, as the shop's own do. */
const nextId = (): string => String((made += 1)).padStart(6, '0');

/** A rewind of an account customer of which nothing is known yet. */
export const factsOf = (more: Partial<JobFacts> = {}): JobFacts => ({
  route: 'rewind',
  step: 'received',
  state: 'open',
  limits: DEFAULT_LIMITS,
  records: [],
  signOffs: [],
  quotes: [],
  certificateInForce: false,
  invoices: [],
  customer: { terms: 'account', creditStop: false },
  onePersonMayRelease: false,
  ...more,
});

/** The next record of the job: younger than all before it. */
export function record(kind: RecordKind, verdict: string | null = null, more: Partial<RecordFact> = {}): RecordFact {
  const id = nextId();
  return { id, kind, ordinal: Number(id), revision: 1, verdict, readings: {}, result: {}, contentHash: `${id} rev 1`, byUserId: 'mara', overdueInstruments: [], ...more };
}

/** The same record after a correction: its content is another. */
export const corrected = (r: RecordFact, verdict = r.verdict): RecordFact => ({ ...r, verdict, revision: r.revision + 1, contentHash: `${r.id} rev ${r.revision + 1}` });

export function signed(kind: SignOffKind, under: RecordFact | null = null, more: Partial<SignOffFact> = {}): SignOffFact {
  const id = nextId();
  return { id, kind, recordId: under?.id ?? null, refersTo: null, byUserId: 'jonas', byName: 'Jonas Feld', byRoles: 'manager', at: '2026-03-02T09:00:00.000Z', reason: '', contentHash: under?.contentHash ?? '', detail: {}, version: 1, ...more };
}

/** The customer's answer on a core that does not conform. */
export const answer = (about: 'core-test-before' | 'core-test-after', choice: string, on: RecordFact): SignOffFact => signed('decision', on, { detail: { about, choice } });

/** A core test after, held against this test before. */
export const heldAgainst = (before: RecordFact, verdict: string): RecordFact => record('core-test-after', verdict, { result: { against: { recordId: before.id, revision: before.revision } } });

/** A waiver of the test before, countersigned or not. */
export function waived(countersigned: boolean): SignOffFact[] {
  const waiver = signed('waiver', null, { reason: 'came-in-stripped' });
  return countersigned ? [waiver, signed('waiver-countersignature', null, { refersTo: waiver.id })] : [waiver];
}
