import type { CorePair } from '@shared/portal';

/** One core test as it is kept: its newest revision's readings and result. */
export interface KeptCoreTest {
  readonly kind: 'core-test-before' | 'core-test-after';
  readonly verdict: string | null;
  readonly readings: Record<string, unknown>;
  readonly result: Record<string, unknown>;
}

/**
 * The core before and after, as its owner sees it. The before test that counts is the last valid one, the after test the
 * last one; both figures stand at the flux they were referred to. What a test could not tell is null, never a number.
 */
export function corePair(tests: readonly KeptCoreTest[]): CorePair | null {
  const before = tests.filter((t) => t.kind === 'core-test-before' && t.verdict !== 'not-valid').at(-1) ?? tests.filter((t) => t.kind === 'core-test-before').at(-1);
  const after = tests.filter((t) => t.kind === 'core-test-after').at(-1);
  if (!before && !after) return null;
  const increase = after ? increaseOf(after) : null;
  return { before: before ? figures(before) : null, after: after ? figures(after) : null, increase, verdict: (after ?? before)!.verdict, established: increase !== null };
}

function figures({ readings, result, verdict }: KeptCoreTest): CorePair['before'] {
  const wattsPerKg = result['wattsPerKgReferred'];
  const expandedUncertainty = result['expandedUncertaintyWPerKg'];
  const fluxDensityT = (readings['target'] as { fluxDensityT?: unknown } | undefined)?.fluxDensityT;
  if (verdict === 'not-valid' || !isNumber(wattsPerKg) || !isNumber(expandedUncertainty) || !isNumber(fluxDensityT)) return null;
  return { wattsPerKg, expandedUncertainty, fluxDensityT };
}

function increaseOf({ result }: KeptCoreTest): CorePair['increase'] {
  const comparison = result['comparison'] as { increase?: unknown; expandedUncertainty?: unknown; valid?: unknown } | undefined;
  const judgements = (result['judgements'] ?? []) as { test?: unknown; limit?: unknown }[];
  const limit = judgements.find((j) => j.test === 'increase')?.limit;
  if (result['increaseEstablished'] !== true || !comparison?.valid) return null;
  const { increase, expandedUncertainty } = comparison;
  return isNumber(increase) && isNumber(expandedUncertainty) && isNumber(limit) ? { fraction: increase, expandedUncertainty, limitFraction: limit } : null;
}

const isNumber = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
