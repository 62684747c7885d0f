import type { LimitsSet } from '@shared/limits';
import type { QuoteState } from '@shared/quotes';
import type { RecordKind } from '@shared/records';
import type { JobState, Route, Step } from '@shared/route';
import type { SignOffKind } from '../sign-offs/sign-off.entity.js';

/** A record as the gates see it: its newest revision. */
export interface RecordFact {
  readonly id: string;
  readonly kind: RecordKind;
  readonly ordinal: number;
  readonly revision: number;
  readonly verdict: string | null;
  readonly readings: Record<string, unknown>;
  readonly result: Record<string, unknown>;
  readonly contentHash: string;
  readonly byUserId: string;
  readonly overdueInstruments: readonly string[];
}

export interface SignOffFact {
  readonly id: string;
  readonly kind: SignOffKind;
  readonly recordId: string | null;
  readonly refersTo: string | null;
  readonly byUserId: string;
  readonly byName: string;
  readonly byRoles: string;
  readonly at: string;
  readonly reason: string;
  readonly contentHash: string;
  readonly detail: Record<string, unknown>;
  readonly version: number;
}

/** Everything the gates of one job decide on, loaded beforehand. */
export interface JobFacts {
  readonly route: Route;
  readonly step: Step;
  readonly state: JobState;
  readonly limits: LimitsSet;
  readonly records: readonly RecordFact[];
  readonly signOffs: readonly SignOffFact[];
  readonly quotes: readonly { readonly id: string; readonly state: QuoteState; readonly revision: number }[];
  readonly certificateInForce: boolean;
  readonly invoices: readonly { readonly number: string; readonly balanceMinor: number }[];
  readonly customer: { readonly terms: 'prepayment' | 'account'; readonly creditStop: boolean };
  readonly onePersonMayRelease: boolean;
}

export const recordsOf = (facts: JobFacts, kind: RecordKind): readonly RecordFact[] =>
  facts.records.filter((r) => r.kind === kind).sort((a, b) => a.ordinal - b.ordinal);

export const lastOf = (facts: JobFacts, kind: RecordKind): RecordFact | undefined => recordsOf(facts, kind).at(-1);

/** A signature counts only for the very revision it was given for. */
export const signedFor = (facts: JobFacts, kind: SignOffKind, record: RecordFact): SignOffFact | undefined =>
  facts.signOffs.find((s) => s.kind === kind && s.recordId === record.id && s.contentHash === record.contentHash);
