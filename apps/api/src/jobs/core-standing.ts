import { lastOf, recordsOf, signedFor, type JobFacts, type RecordFact, type SignOffFact } from './job-facts.js';

/** How the core stands, as the gates see it. */
export type CoreStanding =
  /** no test, or the core was repaired since the last one */
  | { readonly kind: 'missing'; readonly repairedSince: boolean }
  /** by its own reasons, or because the before test it was held against was corrected later */
  | { readonly kind: 'not-valid'; readonly record: RecordFact; readonly beforeCorrected: boolean }
  | { readonly kind: 'conforms'; readonly record: RecordFact }
  | { readonly kind: 'inconclusive'; readonly record: RecordFact; readonly releasedBy: SignOffFact | undefined }
  | { readonly kind: 'does-not-conform'; readonly record: RecordFact; readonly concession: SignOffFact | undefined };

const missing = (repairedSince: boolean): CoreStanding => ({ kind: 'missing', repairedSince });

function standingOf(facts: JobFacts, record: RecordFact | undefined): CoreStanding {
  if (!record) return missing(false);
  switch (record.verdict) {
    case 'conforms':
      return { kind: 'conforms', record };
    case 'inconclusive':
      return { kind: 'inconclusive', record, releasedBy: signedFor(facts, 'inconclusive-release', record) };
    case 'does-not-conform':
      return { kind: 'does-not-conform', record, concession: signedFor(facts, 'concession', record) };
    default:
      return { kind: 'not-valid', record, beforeCorrected: false };
  }
}

/** Identifiers sort by time: the younger record has the larger one. A correction keeps the identifier. */
const madeSince = (younger: RecordFact | undefined, older: RecordFact): boolean => younger !== undefined && younger.id > older.id;

const firstStrip = (facts: JobFacts): RecordFact | undefined => recordsOf(facts, 'strip')[0];

/** Tests made while the old winding was in. One that came after the strip is no test before, whatever it is called. */
const testsBefore = (facts: JobFacts): readonly RecordFact[] => {
  const strip = firstStrip(facts);
  return recordsOf(facts, 'core-test-before').filter((r) => !strip || !madeSince(r, strip));
};

/** The before test that counts: the last one that is valid. */
export const validBefore = (facts: JobFacts): RecordFact | undefined => testsBefore(facts).filter((r) => r.verdict !== 'not-valid').at(-1);

/** A repair before the strip asks for the test anew: the after test is held against the core as it went into the strip. */
export function coreBefore(facts: JobFacts): CoreStanding {
  const record = validBefore(facts) ?? testsBefore(facts).at(-1);
  if (record && !firstStrip(facts) && madeSince(lastOf(facts, 'core-repair'), record)) return missing(true);
  return standingOf(facts, record);
}

/** The last test after counts, as long as neither a repair nor a correction of the before test came later. */
export function coreAfter(facts: JobFacts): CoreStanding {
  const record = lastOf(facts, 'core-test-after');
  if (!record) return missing(false);
  if (madeSince(lastOf(facts, 'core-repair'), record)) return missing(true);
  if (heldAgainstOlder(facts, record)) return { kind: 'not-valid', record, beforeCorrected: true };
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

/** An answer holds for the record and the revision it was given on; a correction asks again. */
export const decisionAnswers = (decision: SignOffFact | undefined, record: RecordFact): boolean =>
  decision !== undefined && decision.recordId === record.id && decision.contentHash === record.contentHash;
