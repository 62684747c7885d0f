import { OutOfRangeError } from '@libs/quantities';

const positive = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value) && value > 0;

/** Temperature at which copper's resistance would be zero, as IEEE and NEMA print it; IEC 60034-1 prints 235. */
export const COPPER_ZERO_C = 234.5;

/**
 * A copper resistance carried from one temperature to another.
 *
 * `R_2 = R_1·(k + t_2)/(k + t_1)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | R_1 | `resistanceOhm` | Ω | more than 0 |
 * | t_1, t_2 | `fromC`, `toC` | °C | above −k |
 * | k | `zeroC` | – | 234.5 copper (IEEE), 235 copper (IEC), 225 aluminium |
 *
 * @returns Ω
 * @throws OutOfRangeError when a figure is missing or out of range
 *
 * Source: IEEE 112, NEMA MG 1, IEC 60034-1. Standing: from memory, values computed.
 * @example
 * resistanceAt(1, 25, 75)
 * // → 1.19268
 */
export function resistanceAt(resistanceOhm: number, fromC: number, toC: number, zeroC: number = COPPER_ZERO_C): number {
  if (!positive(resistanceOhm)) throw new OutOfRangeError('resistanceOhm', 'Measure the resistance: more than 0.');
  if (!positive(zeroC)) throw new OutOfRangeError('zeroC', 'Take 234.5 for copper, 225 for aluminium.');
  if (!positive(zeroC + fromC)) throw new OutOfRangeError('fromC', 'Enter the temperature of the winding in °C.');
  if (!positive(zeroC + toC)) throw new OutOfRangeError('toC', 'Enter the temperature to refer to in °C.');
  return (resistanceOhm * (zeroC + toC)) / (zeroC + fromC);
}

/**
 * Temperature rise of a winding from its cold and its hot resistance.
 *
 * `Δθ = (R_2 − R_1)/R_1·(k + t_1) + t_1 − t_a`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | R_1, t_1 | `coldOhm`, `coldC` | Ω, °C | cold winding |
 * | R_2 | `hotOhm` | Ω | at the instant of switching off |
 * | t_a | `coolantC` | °C | coolant at the end of the run |
 * | k | `zeroC` | – | as `resistanceAt` |
 *
 * @returns K
 * @throws OutOfRangeError when a figure is missing or out of range
 *
 * Source: IEC 60034-1 8.6.2. Standing: from memory, value computed.
 * @example
 * riseByResistanceK(0.4, 22, 0.512, 30)
 * // → 63.82
 */
export function riseByResistanceK(coldOhm: number, coldC: number, hotOhm: number, coolantC: number, zeroC: number = COPPER_ZERO_C): number {
  if (!positive(coldOhm)) throw new OutOfRangeError('coldOhm', 'Measure the cold resistance: more than 0.');
  if (!positive(hotOhm)) throw new OutOfRangeError('hotOhm', 'Measure the hot resistance: more than 0.');
  if (!positive(zeroC + coldC)) throw new OutOfRangeError('coldC', 'Enter the temperature of the cold winding in °C.');
  if (!Number.isFinite(coolantC)) throw new OutOfRangeError('coolantC', 'Enter the temperature of the coolant in °C.');
  return ((hotOhm - coldOhm) / coldOhm) * (zeroC + coldC) + coldC - coolantC;
}

/**
 * Unbalance of three phases: the largest deviation from the mean, over the mean. It serves volts, amperes and ohms.
 * The spread (largest − least) is another figure, nearly twice as large: the two do not mix.
 *
 * `u = max|x_i − x̄| / x̄`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | x_i | `values` | V, A or Ω | two or more, each more than 0 |
 *
 * @returns a fraction: 0.0104 is 1.04 %
 * @throws OutOfRangeError when fewer than two values are given or one is not more than 0
 *
 * Source: NEMA MG 1 12.45 and 14.36. Standing: quoted in a source that was read.
 * @example
 * unbalanceFraction([462, 463, 455])
 * // → 0.01087
 */
export function unbalanceFraction(values: readonly number[]): number {
  if (values.length < 2) throw new OutOfRangeError('values', 'Measure all three.');
  if (!values.every(positive)) throw new OutOfRangeError('values', 'Measure all three: each more than 0.');
  const mean = meanOf(values);
  return Math.max(...values.map((x) => Math.abs(x - mean))) / mean;
}

export const meanOf = (values: readonly number[]): number => values.reduce((sum, x) => sum + x, 0) / values.length;
