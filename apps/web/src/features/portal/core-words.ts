import type { StripBar, StripDrawingInput } from '@libs/drawings';
import { formatUsual, toShown, unitOf, type UnitSystem } from '@libs/quantities';
import type { CorePair } from '@shared/portal';
import { signedPercent } from '../../lib/core-strip.js';
import { defineText } from '../../lib/text.js';

const t = defineText({
  before: 'before',
  after: 'after',
  interval: '± {points} points',
  limit: 'limit {increase} ({figure})',
  notComparable: 'The two tests cannot be compared.',

  more: 'After the old winding came out the core loses {percent} % more than before, give or take {points} %.',
  less: 'After the old winding came out the core loses {percent} % less than before, give or take {points} %.',
  accepted: 'Up to {limit} % more is accepted.',
  conforms: 'Your core took no harm.',
  'does-not-conform': 'That is too much: we speak with you about what to do.',
  inconclusive: 'That is too close to the limit to say for sure; we speak with you about it.',
  'not-valid': 'One of the tests does not count; it is made again.',
  'shown-not-judged': 'The figures are shown without a judgement.',
  onlyBefore: 'The core was tested before the old winding came out. It is tested again afterwards, and you see both here.',
  onlyAfter: 'There is no test from before the old winding came out, so the core was judged by itself.',
  notEstablished: 'The two tests cannot be compared with each other, so no increase is stated.',
  absoluteOk: 'It is within its limit.',
  absoluteNotOk: 'It is over its limit: we speak with you about what to do.',
});
type Judged = 'conforms' | 'does-not-conform' | 'inconclusive' | 'not-valid' | 'shown-not-judged';
const isJudged = (verdict: string | null): verdict is Judged => verdict !== null && ['conforms', 'does-not-conform', 'inconclusive', 'not-valid', 'shown-not-judged'].includes(verdict);
const percent = (fraction: number, digits = 1): string => Math.abs(fraction * 100).toFixed(digits);

/** Before and after on one scale, in the reader's units; null where neither test gave a figure. */
export function coreStripOf({ before, after, increase, established }: CorePair, units: UnitSystem): StripDrawingInput | null {
  if (!before && !after) return null;
  const shown = (wattsPerKg: number) => toShown(wattsPerKg, 'specific-loss', units);
  const figure = (wattsPerKg: number) => formatUsual(wattsPerKg, 'specific-loss', units, { unit: false });
  const bar = (label: string, test: NonNullable<CorePair['before']>): StripBar => ({
    label,
    value: shown(test.wattsPerKg),
    uncertainty: shown(test.expandedUncertainty),
    words: `${figure(test.wattsPerKg)} ± ${figure(test.expandedUncertainty)}`,
  });
  const limitAt = before && increase ? before.wattsPerKg * (1 + increase.limitFraction) : null;
  return {
    before: before ? bar(t('before'), before) : null,
    after: after ? [bar(t('after'), after)] : [],
    limit: limitAt !== null ? { value: shown(limitAt), words: t('limit', { increase: `+${percent(increase!.limitFraction, 0)} %`, figure: figure(limitAt) }) } : null,
    increase: increase
      ? { figure: signedPercent(increase.fraction), interval: t('interval', { points: percent(increase.expandedUncertainty) }) }
      : before && after && !established
        ? { figure: '', interval: t('notComparable') }
        : null,
    unit: unitOf('specific-loss', units),
  };
}

/** What the two core tests say, for somebody who has never heard of watts per kilogram. */
export function coreWords({ before, after, increase, verdict }: CorePair): string[] {
  if (increase) {
    const figures = { percent: percent(increase.fraction), points: percent(increase.expandedUncertainty) };
    return [t(increase.fraction < 0 ? 'less' : 'more', figures), t('accepted', { limit: percent(increase.limitFraction, 0) }), ...(isJudged(verdict) ? [t(verdict)] : [])];
  }
  if (before && !after) return [t('onlyBefore')];
  const why = before && after ? t('notEstablished') : t('onlyAfter');
  if (!after) return isJudged(verdict) ? [t(verdict)] : [];
  if (verdict === 'conforms') return [why, t('absoluteOk')];
  if (verdict === 'does-not-conform') return [why, t('absoluteNotOk')];
  return [why, ...(isJudged(verdict) ? [t(verdict)] : [])];
}
