import { OutOfRangeError } from './out-of-range-error.js';

/** ∫ of the bell curve from 0 to z, by its series; good to the last places for |z| < 5. */
function bellSeries(z: number): number {
  let term = z;
  let sum = z;
  for (let n = 1; Math.abs(term) > 1e-17 * Math.abs(sum); n += 1) {
    term *= (z * z) / (2 * n + 1);
    sum += term;
  }
  return (sum * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI);
}

/** The tail beyond z ≥ 3, by its continued fraction: the series would lose the small figure in the large one. */
function bellTail(z: number): number {
  let fraction = z;
  for (let n = 120; n >= 1; n -= 1) fraction = z + n / fraction;
  return Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI) / fraction;
}

/**
 * Share of the normal distribution below z.
 *
 * `Φ(z) = ∫_{−∞}^{z} e^(−t²/2) dt / √(2π)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | z | `z` | standard deviations | any; −∞ and ∞ give 0 and 1 |
 *
 * @returns 0 to 1
 * @throws OutOfRangeError when z is not a number
 *
 * Source: any book of statistics. Standing: computed.
 * @example
 * normalShareBelow(1.645)
 * // → 0.9500
 */
export function normalShareBelow(z: number): number {
  if (Number.isNaN(z)) throw new OutOfRangeError('z', 'z must be a number.');
  if (z < -3) return z === -Infinity ? 0 : bellTail(-z);
  if (z > 3) return z === Infinity ? 1 : 1 - bellTail(z);
  return 0.5 + bellSeries(z);
}

/**
 * Probability that the true value lies within the limits, given the result and its uncertainty.
 *
 * `p_c = Φ((T_U − y)/u) − Φ((T_L − y)/u)`, a limit that is missing counts as infinite
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | y | `measured` | any | finite |
 * | u | `standardUncertainty` | of y | more than 0 |
 * | T_L | `limits.lower` | of y | any |
 * | T_U | `limits.upper` | of y | any, not below T_L |
 *
 * @returns 0 to 1
 * @throws OutOfRangeError outside those ranges, or when neither limit is given
 *
 * Source: JCGM 106:2012 clause 7, normal distribution, no prior knowledge. Standing: from memory.
 * @example
 * conformanceProbability(0.186, 0.012, { upper: 0.2 })
 * // → 0.878
 */
export function conformanceProbability(measured: number, standardUncertainty: number, limits: { lower?: number; upper?: number }): number {
  const { lower = -Infinity, upper = Infinity } = limits;
  if (!Number.isFinite(measured)) throw new OutOfRangeError('measured', 'The result must be a number.');
  if (!(Number.isFinite(standardUncertainty) && standardUncertainty > 0)) throw new OutOfRangeError('standardUncertainty', 'The standard uncertainty must be more than 0.');
  if (lower === -Infinity && upper === Infinity) throw new OutOfRangeError('limits', 'Give at least one limit.');
  if (!(lower <= upper)) throw new OutOfRangeError('limits', 'The lower limit stands above the upper one.');
  const above = (lower - measured) / standardUncertainty;
  const below = (upper - measured) / standardUncertainty;
  // taken from the nearer tail, so that a small probability keeps its figures
  return above > 0 ? normalShareBelow(-above) - normalShareBelow(-below) : normalShareBelow(below) - normalShareBelow(above);
}

/**
 * The value a result must keep to so that the limit is met with the guard left free.
 *
 * `A = T − w` for an upper limit, `A = T + w` for a lower one
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | T | `limit` | any | finite |
 * | w | `guard` | of T | 0 (shared risk) or more; U is the guarded rule |
 *
 * @throws OutOfRangeError outside those ranges
 *
 * Source: JCGM 106, ILAC-G8. Standing: quoted in a source that was read.
 * @example
 * acceptanceLimit(20, 2.4, 'upper')
 * // → 17.6
 */
export function acceptanceLimit(limit: number, guard: number, side: 'upper' | 'lower'): number {
  if (!Number.isFinite(limit)) throw new OutOfRangeError('limit', 'A limit must be a number.');
  if (!(Number.isFinite(guard) && guard >= 0)) throw new OutOfRangeError('guard', 'A guard must be 0 or more.');
  return side === 'upper' ? limit - guard : limit + guard;
}
