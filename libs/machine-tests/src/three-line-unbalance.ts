import { OutOfRangeError } from '@libs/quantities';
import { meanOf } from './winding-resistance.js';

const positive = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value) && value > 0;

/**
 * Spread of three readings: largest less least, over the mean. Nothing is judged by it here; it stands apart from
 * `unbalanceFraction`, which it exceeds by up to two times, so that a figure from elsewhere can be told for what it is.
 *
 * `s = (x_max − x_min) / x̄`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | x | `values` | V, A or Ω | two or more, each more than 0 |
 *
 * @returns a fraction
 * @throws OutOfRangeError when fewer than two values are given or one is not more than 0
 *
 * Source: used in the trade beside the NEMA definition. Standing: common practice.
 * @example
 * spreadFraction([0.512, 0.508, 0.518])
 * // → 0.01951
 */
export function spreadFraction(values: readonly number[]): number {
  if (values.length < 2 || !values.every(positive)) throw new OutOfRangeError('values', 'Measure all three: each more than 0.');
  return (Math.max(...values) - Math.min(...values)) / meanOf(values);
}

/**
 * Unbalance of line volts by IEC: negative over positive sequence. Line volts close to a triangle, so that their three
 * sizes are enough. Nothing is judged by it here: the limit of the no-load run goes by NEMA's deviation from the mean.
 *
 * `V₂/V₁ = √((1 − √(3 − 6β)) / (1 + √(3 − 6β)))`, `β = ΣU⁴ / (ΣU²)²`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U | `lineVoltsV` | V | three, each more than 0, none as large as the two others together |
 *
 * @returns a fraction: 0 in balance
 * @throws OutOfRangeError when a reading is not more than 0 or the three do not close to a triangle
 *
 * Source: IEC 61000-4-30. Standing: from memory; checked against sequences put together.
 * @example
 * negativeSequenceFraction([462, 463, 455])
 * // → 0.0109
 */
export function negativeSequenceFraction(lineVoltsV: readonly [number, number, number]): number {
  if (!lineVoltsV.every(positive)) throw new OutOfRangeError('lineVoltsV', 'Read the volts of all three lines: more than 0.');
  const largest = Math.max(...lineVoltsV);
  if (largest >= lineVoltsV.reduce((sum, v) => sum + v, 0) - largest) throw new OutOfRangeError('lineVoltsV', 'Three line volts cannot be this far apart. Read them again, line to line.');
  const squares = lineVoltsV.map((v) => (v / largest) ** 2);
  const total = squares.reduce((sum, x) => sum + x, 0);
  const beta = squares.reduce((sum, x) => sum + x * x, 0) / total ** 2;
  // in balance β is 1/3, and binary may put the root a hair above 1
  const root = Math.min(1, Math.sqrt(3 - 6 * beta));
  return Math.sqrt((1 - root) / (1 + root));
}
