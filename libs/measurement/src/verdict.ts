import { OutOfRangeError } from './out-of-range-error.js';

/** The four words for a measured result against a limit. They do not depend on the shop's decision rule. */
export type Verdict = 'conforms' | 'does-not-conform' | 'inconclusive' | 'not-valid';

/** From best to worst: the order in which several verdicts on one thing are summed up. */
export const VERDICTS = ['conforms', 'inconclusive', 'does-not-conform', 'not-valid'] as const satisfies readonly Verdict[];

/** What the shop lets an inconclusive result do at a gate. It never changes the verdict itself. */
export type DecisionRule = 'ask' | 'accept' | 'refuse';

/** What a gate does with a verdict. */
export type GateOutcome = 'open' | 'ask' | 'closed';

/** Equal to twelve places: 17.6 + 2.4 against 20 is at the limit, whatever binary makes of it. */
const atMost = (a: number, b: number) => a <= b + 1e-12 * Math.max(Math.abs(a), Math.abs(b));

const limitNumber = (value: number, field: string): number => {
  if (!Number.isFinite(value)) throw new OutOfRangeError(field, 'A limit must be a number.');
  return value;
};

/** Undefined where the result itself cannot be used; a negative uncertainty is a fault of the caller. */
function interval(measured: number, expandedUncertainty: number): { low: number; high: number } | undefined {
  if (expandedUncertainty < 0) throw new OutOfRangeError('expandedUncertainty', 'An uncertainty cannot be negative.');
  if (!Number.isFinite(measured) || !Number.isFinite(expandedUncertainty)) return undefined;
  return { low: measured - expandedUncertainty, high: measured + expandedUncertainty };
}

/**
 * A result against a limit it must not pass.
 *
 * `y + U ≤ L` conforms; `y − U ≥ L` does not conform; else the limit lies within the uncertainty: inconclusive.
 * A result exactly at the limit conforms when it has no uncertainty.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | y | `measured` | any | a result that is not finite is not valid |
 * | U | `expandedUncertainty` | of y | 0 or more |
 * | L | `limit` | of y | finite |
 *
 * @throws OutOfRangeError when the limit is not finite or the uncertainty negative
 *
 * Source: ISO 14253-1 decision rule; JCGM 106 with guard w = U. Standing: quoted in a source that was read, and from memory.
 * @example
 * judgeUpperLimit(0.186, 0.024, 0.2)
 * // → 'inconclusive'
 */
export function judgeUpperLimit(measured: number, expandedUncertainty: number, limit: number): Verdict {
  limitNumber(limit, 'limit');
  const within = interval(measured, expandedUncertainty);
  if (!within) return 'not-valid';
  if (atMost(within.high, limit)) return 'conforms';
  return atMost(limit, within.low) ? 'does-not-conform' : 'inconclusive';
}

/**
 * A result against a limit it must reach.
 *
 * `y − U ≥ L` conforms; `y + U ≤ L` does not conform; else inconclusive.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | y, U, L | as `judgeUpperLimit` | | |
 *
 * @throws OutOfRangeError as `judgeUpperLimit`
 *
 * Source: as `judgeUpperLimit`.
 * @example
 * judgeLowerLimit(2400, 200, 5)
 * // → 'conforms'
 */
export const judgeLowerLimit = (measured: number, expandedUncertainty: number, limit: number): Verdict =>
  judgeUpperLimit(-measured, expandedUncertainty, -limitNumber(limit, 'limit'));

/**
 * A result against two limits at once: the worse of the two verdicts.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | y, U | as `judgeUpperLimit` | | |
 * | L_low, L_high | `lowerLimit`, `upperLimit` | of y | finite, lower not above upper |
 *
 * @throws OutOfRangeError when the limits are not finite or stand the wrong way round
 *
 * Source: as `judgeUpperLimit`.
 * @example
 * judgeRange(13.6, 3.6, 12.5, 16.3)
 * // → 'inconclusive'
 */
export function judgeRange(measured: number, expandedUncertainty: number, lowerLimit: number, upperLimit: number): Verdict {
  if (limitNumber(lowerLimit, 'lowerLimit') > limitNumber(upperLimit, 'upperLimit')) {
    throw new OutOfRangeError('lowerLimit', 'The lower limit stands above the upper one.');
  }
  return worstOf([judgeLowerLimit(measured, expandedUncertainty, lowerLimit), judgeUpperLimit(measured, expandedUncertainty, upperLimit)]);
}

/**
 * One verdict for several results on one thing: the worst, where not valid is worse than not conforming, because
 * nobody can then say what the thing is.
 *
 * @throws OutOfRangeError when there is nothing to sum up
 *
 * Standing: common practice.
 * @example
 * worstOf(['conforms', 'inconclusive'])
 * // → 'inconclusive'
 */
export function worstOf(verdicts: readonly Verdict[]): Verdict {
  if (verdicts.length === 0) throw new OutOfRangeError('verdicts', 'There is no verdict to sum up.');
  return verdicts.reduce((worst, next) => (VERDICTS.indexOf(next) > VERDICTS.indexOf(worst) ? next : worst));
}

/**
 * What a verdict does at a gate under the shop's decision rule. Only an inconclusive result depends on the rule.
 *
 * | verdict | ask | accept | refuse |
 * |---|---|---|---|
 * | conforms | open | open | open |
 * | inconclusive | ask | open | closed |
 * | does not conform, not valid | closed | closed | closed |
 *
 * Source: simple acceptance and guarded acceptance after JCGM 106 and ILAC-G8. Standing: quoted in a source that was read.
 * @example
 * gateOutcome('inconclusive', 'ask')
 * // → 'ask'
 */
export function gateOutcome(verdict: Verdict, rule: DecisionRule): GateOutcome {
  if (verdict === 'conforms') return 'open';
  if (verdict !== 'inconclusive') return 'closed';
  return rule === 'ask' ? 'ask' : rule === 'accept' ? 'open' : 'closed';
}
