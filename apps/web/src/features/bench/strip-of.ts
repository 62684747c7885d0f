import type { StripBar, StripDrawingInput } from '@libs/drawings';
import type { CoreTestResult } from '@libs/core-loss';
import { formatUsual, toShown, unitOf, type UnitSystem } from '@libs/quantities';
import { signedPercent } from '../../lib/core-strip.js';
import { t } from './text.js';


export function increaseWords(result: Pick<CoreTestResult, 'comparison'>): { figure: string; interval: string } | null {
  const { comparison } = result;
  if (!comparison) return null;
  return {
    figure: signedPercent(comparison.increase),
    interval: t('interval', { points: (comparison.expandedUncertainty * 100).toFixed(1), low: signedPercent(comparison.low), high: signedPercent(comparison.high) }),
  };
}

interface StripOf {
  readonly before: CoreTestResult | null;
  readonly after: readonly { readonly label: string; readonly result: CoreTestResult }[];
  readonly increaseLimit: number;
  readonly system: UnitSystem;
}

/** Before and after on one scale, in the person's units; the limit is the increase's, laid over the before test. */
export function stripOf({ before, after, increaseLimit, system }: StripOf): StripDrawingInput {
  const shown = (si: number) => toShown(si, 'specific-loss', system);
  const figure = (si: number) => formatUsual(si, 'specific-loss', system, { unit: false });
  const bar = (label: string, r: CoreTestResult): StripBar => ({
    label,
    value: shown(r.wattsPerKgReferred),
    uncertainty: shown(r.expandedUncertaintyWPerKg),
    words: `${figure(r.wattsPerKgReferred)} ± ${figure(r.expandedUncertaintyWPerKg)}`,
  });
  const last = after.at(-1);
  return {
    before: before ? bar(t('before'), before) : null,
    after: after.map(({ label, result }) => bar(label, result)),
    limit: before ? { value: shown(before.wattsPerKgReferred * (1 + increaseLimit)), words: t('limitWords', { percent: Math.round(increaseLimit * 1000) / 10 }) } : null,
    increase: last ? increaseWords(last.result) : null,
    unit: unitOf('specific-loss', system),
    title: t('stripTitle'),
  };
}
