/** Names of the patterns, as they stand on the chart. */
export type RunRule = 'one-beyond-3-sigma' | 'two-of-three-beyond-2-sigma' | 'four-of-five-beyond-1-sigma' | 'eight-on-one-side' | 'six-rising' | 'six-falling';

export interface RunRuleText {
  readonly rule: RunRule;
  /** how a person says it */
  readonly words: string;
  /** points the pattern needs */
  readonly length: number;
  readonly source: string;
  readonly standing: string;
}

const WESTERN_ELECTRIC = 'Western Electric, Statistical Quality Control Handbook (1956); listed in NIST/SEMATECH e-Handbook 6.3.2';
const TREND = 'NIST/SEMATECH e-Handbook 6.3.2, trend rule; L. S. Nelson, Journal of Quality Technology 1984, test 3';

/** Each rule with where it comes from and how far that was checked. */
export const RUN_RULES: readonly RunRuleText[] = [
  { rule: 'one-beyond-3-sigma', words: 'one point beyond 3 sigma', length: 1, source: WESTERN_ELECTRIC, standing: 'quoted in sources that were read' },
  { rule: 'two-of-three-beyond-2-sigma', words: '2 of 3 beyond 2 sigma, same side', length: 3, source: WESTERN_ELECTRIC, standing: 'quoted in sources that were read' },
  { rule: 'four-of-five-beyond-1-sigma', words: '4 of 5 beyond 1 sigma, same side', length: 5, source: WESTERN_ELECTRIC, standing: 'quoted in sources that were read' },
  { rule: 'eight-on-one-side', words: '8 in a row on one side', length: 8, source: WESTERN_ELECTRIC, standing: 'quoted in sources that were read' },
  { rule: 'six-rising', words: '6 in a row rising', length: 6, source: TREND, standing: 'from memory' },
  { rule: 'six-falling', words: '6 in a row falling', length: 6, source: TREND, standing: 'from memory' },
];

/**
 * The patterns that a point completes. `deviations` are distances from the centre line in sigmas, in time order; only the
 * points up to `index` are looked at, so that a chart kept up job by job gives the same as one drawn at the end.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | z_i | `deviations[i]` | sigma | finite |
 * | i | `index` | – | 0 to the last |
 *
 * A point exactly on a zone's line is not beyond it, and one on the centre line is on neither side. The point that completes
 * "2 of 3" or "4 of 5" lies beyond the line itself. Two equal neighbours end a rise or fall.
 *
 * @returns names of the rules, in the order of `RUN_RULES`; empty where the point completes none
 *
 * Source: as `RUN_RULES`.
 * @example
 * rulesCompletedAt([0, 2.1, 0.3, 2.4], 3)
 * // → ['two-of-three-beyond-2-sigma']
 */
export function rulesCompletedAt(deviations: readonly number[], index: number): RunRule[] {
  const here = deviations[index];
  if (here === undefined || here === 0) return completedTrends(deviations, index);
  const side = Math.sign(here);
  const last = (count: number) => deviations.slice(Math.max(0, index - count + 1), index + 1).map((z) => z * side);
  const beyond = (count: number, sigmas: number) => (here * side > sigmas ? last(count).filter((z) => z > sigmas).length : 0);
  const rules: RunRule[] = [];
  if (here * side > 3) rules.push('one-beyond-3-sigma');
  if (beyond(3, 2) >= 2) rules.push('two-of-three-beyond-2-sigma');
  if (beyond(5, 1) >= 4) rules.push('four-of-five-beyond-1-sigma');
  if (beyond(8, 0) === 8) rules.push('eight-on-one-side');
  return [...rules, ...completedTrends(deviations, index)];
}

function completedTrends(deviations: readonly number[], index: number): RunRule[] {
  const six = deviations.slice(Math.max(0, index - 5), index + 1);
  if (six.length < 6) return [];
  const steps = six.slice(1).map((z, i) => z - six[i]!);
  if (steps.every((step) => step > 0)) return ['six-rising'];
  return steps.every((step) => step < 0) ? ['six-falling'] : [];
}
