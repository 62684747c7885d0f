import { lastOf, recordsOf, signedFor, type JobFacts, type RecordFact, type SignOffFact } from './job-facts.js';

/** How the core stands, as the gates see it. */
export type CoreStanding =
  | { readonly kind: 'missing' }
  | { readonly kind: 'not-valid'; readonly record: RecordFact }
  | { readonly kind: 'conforms'; readonly record: RecordFact }
  | { readonly kind: 'inconclusive'; readonly record: RecordFact; readonly releasedBy: SignOffFact | undefined }
  | { readonly kind: 'does-not-conform'; readonly record: RecordFact; readonly concession: SignOffFact | undefined };

function standingOf(facts: JobFacts, record: RecordFact | undefined): CoreStanding {
  if (!record) return { kind: 'missing' };
  switch (record.verdict) {
    case 'conforms':
      return { kind: 'conforms', record };
    case 'inconclusive':
      return { kind: 'inconclusive', record, releasedBy: signedFor(facts, 'inconclusive-release', record) };
    case 'does-not-conform':
      return { kind: 'does-not-conform', record, concession: signedFor(facts, 'concession', record) };
    default:
      return { kind: 'not-valid', record };
  }
}

export const coreBefore = (facts: JobFacts): CoreStanding => standingOf(facts, lastOf(facts, 'core-test-before'));

/** The last test after counts, as long as neither a repair nor a correction of the before test came later. */
export function coreAfter(facts: JobFacts): CoreStanding {
  const record = lastOf(facts, 'core-test-after');
  const repair = lastOf(facts, 'core-repair');
  if (record && repair && repair.id > record.id) return { kind: 'missing' };
  if (record && heldAgainstOlder(facts, record)) return { kind: 'not-valid', record };
  return standingOf(facts, record);
}

function heldAgainstOlder(facts: JobFacts, after: RecordFact): boolean {
  const against = after.result['against'] as { recordId: string; revision: number } | undefined;
  const before = validBefore(facts);
  return against !== undefined && (before?.id !== against.recordId || before.revision !== against.revision);
}

export const waiverInForce = (facts: JobFacts): boolean =>
  facts.signOffs.some((s) => s.kind === 'waiver' && facts.signOffs.some((c) => c.kind === 'waiver-countersignature' && c.refersTo === s.id));

export const waiverAsked = (facts: JobFacts): boolean => facts.signOffs.some((s) => s.kind === 'waiver');

export const decisionOn = (facts: JobFacts, about: 'core-test-before' | 'core-test-after'): SignOffFact | undefined =>
  facts.signOffs.filter((s) => s.kind === 'decision' && s.detail['about'] === about).at(-1);

/** A decision must be younger than the record it decides on. */
export const decisionAnswers = (decision: SignOffFact | undefined, record: RecordFact): boolean => decision !== undefined && decision.recordId === record.id;

/** The before test that counts: the last one that is valid. */
export const validBefore = (facts: JobFacts): RecordFact | undefined =>
  recordsOf(facts, 'core-test-before')
    .filter((r) => r.verdict !== 'not-valid')
    .at(-1);
