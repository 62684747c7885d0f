import { coreResultOf, countingAfter, countingBefore, type CoreRecord } from '../../lib/core-figures.js';

/** What one visit says about the core: the tests that counted, and how they compare. */
export interface CoreVisit {
  readonly before: { readonly wattsPerKg: number; readonly expandedUncertaintyWPerKg: number } | null;
  readonly after: { readonly wattsPerKg: number; readonly expandedUncertaintyWPerKg: number } | null;
  readonly fluxDensityT: number | null;
  readonly increase: number | null;
  readonly verdict: string | null;
}

/** Null where the visit has no core test that can be read; a test that is not valid gives no figure. */
export function coreVisitOf(records: readonly CoreRecord[]): CoreVisit | null {
  const tests = { before: countingBefore(records), after: countingAfter(records) };
  const last = tests.after ?? tests.before;
  if (!last) return null;
  const figure = (record: CoreRecord | undefined) => {
    const result = record && record.verdict !== 'not-valid' ? coreResultOf(record) : null;
    return result && { wattsPerKg: result.wattsPerKgReferred, expandedUncertaintyWPerKg: result.expandedUncertaintyWPerKg };
  };
  const result = coreResultOf(last);
  return {
    before: figure(tests.before),
    after: figure(tests.after),
    fluxDensityT: result ? result.fluxDensityT / result.fluxShareOfTarget : null,
    increase: tests.after && result?.increaseEstablished && result.comparison ? result.comparison.increase : null,
    verdict: last.verdict,
  };
}
