import type { StripBar, StripDrawingInput } from '@libs/drawings';
import { formatUsual, toShown, unitOf, type UnitSystem } from '@libs/quantities';
import { countingBefore, coreResultOf, testsAfter, type CoreRecord } from './core-figures.js';
import { defineText } from './text.js';

const t = defineText({
  before: 'before',
  after: 'after',
  afterNo: 'after, no. {n}',
  limitIncrease: 'limit {increase} ({figure})',
  limitAbsolute: 'limit {figure}',
  interval: '{low} to {high}',
  notComparable: 'Increase not established: the two tests cannot be compared.',
});

export const signedPercent = (fraction: number): string => `${fraction < 0 ? '−' : '+'}${Math.abs(fraction * 100).toFixed(1)} %`;

/** Before and after on one scale, in the reader's units, as the certificate will print it. */
export function coreStrip(records: readonly CoreRecord[], units: UnitSystem): StripDrawingInput {
  const shown = (wattsPerKg: number) => toShown(wattsPerKg, 'specific-loss', units);
  const figure = (wattsPerKg: number) => formatUsual(wattsPerKg, 'specific-loss', units, { unit: false });
  const before = countingBefore(records);
  const beforeResult = before && coreResultOf(before);
  const validBefore = beforeResult && before.verdict !== 'not-valid' ? beforeResult : null;
  const afters = testsAfter(records).flatMap((record) => {
    const result = coreResultOf(record);
    return result && record.verdict !== 'not-valid' ? [result] : [];
  });
  const last = afters.at(-1);
  const bar = (label: string, result: { wattsPerKgReferred: number; expandedUncertaintyWPerKg: number }): StripBar => ({
    label,
    value: shown(result.wattsPerKgReferred),
    uncertainty: shown(result.expandedUncertaintyWPerKg),
    words: `${figure(result.wattsPerKgReferred)} ± ${figure(result.expandedUncertaintyWPerKg)}`,
  });
  const judged = (test: string) => last?.judgements.find((j) => j.test === test && j.verdict !== 'shown-not-judged' && j.verdict !== 'not-valid')?.limit;
  const increaseLimit = judged('increase');
  const absoluteLimit = judged('absolute');
  const limitAt = validBefore && increaseLimit !== undefined ? validBefore.wattsPerKgReferred * (1 + increaseLimit) : undefined;
  const limit =
    limitAt !== undefined && increaseLimit !== undefined
      ? { value: shown(limitAt), words: t('limitIncrease', { increase: `+${Math.round(increaseLimit * 100)} %`, figure: figure(limitAt) }) }
      : absoluteLimit !== undefined
        ? { value: shown(absoluteLimit), words: t('limitAbsolute', { figure: figure(absoluteLimit) }) }
        : null;
  const comparison = last?.increaseEstablished ? last.comparison : undefined;
  return {
    before: validBefore ? bar(t('before'), validBefore) : null,
    after: afters.map((result, i) => bar(afters.length > 1 && i < afters.length - 1 ? t('afterNo', { n: i + 1 }) : t('after'), result)),
    limit,
    increase: comparison
      ? { figure: signedPercent(comparison.increase), interval: t('interval', { low: signedPercent(comparison.low), high: signedPercent(comparison.high) }) }
      : validBefore && last
        ? { figure: '', interval: t('notComparable') }
        : null,
    unit: unitOf('specific-loss', units),
  };
}
