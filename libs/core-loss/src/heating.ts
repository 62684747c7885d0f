import { OutOfRangeError } from '@libs/quantities';

/** Specific heat of silicon steel, J/(kg·K): 460 to 490 are quoted. */
export const STEEL_HEAT_J_PER_KG_K = 480;
/** Share of the heat that stays in a core during the first half hour; the rest goes to the air. */
const KEPT = 0.8;

const atLeastZero = (value: number, field: string): number => {
  if (!(Number.isFinite(value) && value >= 0)) throw new OutOfRangeError(field, `${field} must be 0 or more.`);
  return value;
};

/**
 * Local loss from how fast a place warms, before heat has had time to flow.
 *
 * `p = c·dT/dt`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | dT/dt | `kelvinPerMinute` | K/min | 0 or more, slope of the first one to three minutes |
 * | c | `specificHeat` | J/(kg·K) | 460 to 490, 480 when left out |
 *
 * A spot of 10 mm is already smeared after a quarter of a minute: the surface slope understates a small spot.
 *
 * @returns W/kg
 * @throws OutOfRangeError when the slope or the heat is negative or not finite
 *
 * Source: heat balance, adiabatic start. Standing: computed; specific heat from memory.
 * @example
 * lossFromHeating(1)
 * // → 8.00
 */
export const lossFromHeating = (kelvinPerMinute: number, specificHeat = STEEL_HEAT_J_PER_KG_K): number =>
  (atLeastZero(specificHeat, 'specificHeat') * atLeastZero(kelvinPerMinute, 'kelvinPerMinute')) / 60;

/**
 * How far the mean of a sound core warms during the test: so that nobody takes a warm core for a faulty one.
 *
 * `ΔT = 0.8·p·t·60/c`, about `0.8·p/8·t`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | p | `wattsPerKg` | W/kg | 0 or more |
 * | t | `minutes` | min | 0 to about 30 |
 *
 * @returns K over the start
 * @throws OutOfRangeError when an argument is negative or not finite
 *
 * Source: heat balance; the 0.8 kept by the core is a guess. Standing: common practice.
 * @example
 * meanRiseEstimateK(4, 20)
 * // → 8.0
 */
export const meanRiseEstimateK = (wattsPerKg: number, minutes: number): number =>
  (KEPT * atLeastZero(wattsPerKg, 'wattsPerKg') * atLeastZero(minutes, 'minutes') * 60) / STEEL_HEAT_J_PER_KG_K;
