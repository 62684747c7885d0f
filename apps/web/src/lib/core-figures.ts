import type { CoreTestResult } from '@libs/core-loss';
import type { RecordKind } from '@shared/records';

/** As much of a record as the core's figures need. */
export interface CoreRecord {
  readonly id: string;
  readonly kind: RecordKind;
  readonly verdict: string | null;
  readonly result: Record<string, unknown>;
}

/** The result of a core test; null for a record that is none, or whose result cannot be read. */
export function coreResultOf(record: CoreRecord): CoreTestResult | null {
  if (record.kind !== 'core-test-before' && record.kind !== 'core-test-after') return null;
  const result = record.result as Partial<CoreTestResult>;
  const readable = Number.isFinite(result.wattsPerKgReferred) && Number.isFinite(result.expandedUncertaintyWPerKg) && Array.isArray(result.judgements);
  return readable ? (result as CoreTestResult) : null;
}

/** The before test that counts: the last valid one of those made while the old winding was in. */
export function countingBefore<R extends CoreRecord>(records: readonly R[]): R | undefined {
  const strip = records.filter((r) => r.kind === 'strip').sort(byId)[0];
  const tests = records.filter((r) => r.kind === 'core-test-before' && (!strip || r.id < strip.id)).sort(byId);
  return tests.filter((r) => r.verdict !== 'not-valid').at(-1) ?? tests.at(-1);
}

/** The after test that counts is the last one. */
export const countingAfter = <R extends CoreRecord>(records: readonly R[]): R | undefined => testsAfter(records).at(-1);

export const testsAfter = <R extends CoreRecord>(records: readonly R[]): R[] => records.filter((r) => r.kind === 'core-test-after').sort(byId);

/** Identifiers sort by time. */
const byId = (a: CoreRecord, b: CoreRecord) => (a.id < b.id ? -1 : 1);
