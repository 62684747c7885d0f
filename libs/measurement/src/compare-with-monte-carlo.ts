import type { MonteCarloResult } from './monte-carlo.js';
import { OutOfRangeError } from './out-of-range-error.js';

/** A result of the law of propagation: estimate, standard and expanded uncertainty. */
export interface PropagatedResult {
  estimate: number;
  standardUncertainty: number;
  expandedUncertainty: number;
}

export interface MonteCarloComparison {
  /** Both ends of the interval agree within the tolerance: the simpler way may be used for this case. */
  agrees: boolean;
  differenceLow: number;
  differenceHigh: number;
  /** Half a unit in the last digit of u that is meant. */
  tolerance: number;
}

/**
 * Whether the law of propagation may be trusted for a case: its interval against that of the drawn distributions.
 *
 * `d_low = |y − U − y_low|`, `d_high = |y + U − y_high|`, both at most `δ = ½·10^l`, where u is written `c·10^l` with c of so many digits
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | y, u, U | `propagated` | of the result | u more than 0, U 0 or more |
 * | y_low, y_high | `drawn.symmetric` | of the result | from `propagateDistributions`, same probability |
 * | – | `significantDigits` | – | 1 or 2 |
 *
 * @returns both differences, the tolerance, and whether they agree
 * @throws OutOfRangeError outside those ranges
 *
 * Source: JCGM 101:2008 clauses 7.9.2 and 8. Standing: from memory.
 * @example
 * const drawn = { symmetric: { low: -17.0, high: 17.0 }, shortest: { low: -17.0, high: 17.0 }, estimate: 0, standardUncertainty: 10.1, probability: 0.95, trials: 1000000 }
 * compareWithMonteCarlo({ estimate: 0, standardUncertainty: 10.1, expandedUncertainty: 19.9 }, drawn)
 * // → { agrees: false, differenceLow: 2.9, differenceHigh: 2.9, tolerance: 0.5 }
 */
export function compareWithMonteCarlo(
  propagated: PropagatedResult,
  drawn: Pick<MonteCarloResult, 'symmetric'>,
  significantDigits: 1 | 2 = 2,
): MonteCarloComparison {
  const { estimate, standardUncertainty, expandedUncertainty } = propagated;
  if (!Number.isFinite(estimate)) throw new OutOfRangeError('estimate', 'The estimate must be a number.');
  if (!(Number.isFinite(standardUncertainty) && standardUncertainty > 0)) throw new OutOfRangeError('standardUncertainty', 'The standard uncertainty must be more than 0.');
  if (!(Number.isFinite(expandedUncertainty) && expandedUncertainty >= 0)) throw new OutOfRangeError('expandedUncertainty', 'The expanded uncertainty must be 0 or more.');
  if (significantDigits !== 1 && significantDigits !== 2) throw new OutOfRangeError('significantDigits', 'One or two digits of an uncertainty mean something.');
  // written out by the runtime, so that 0.0996 to one digit is 1·10⁻¹ and not 10·10⁻²
  const power = Number(standardUncertainty.toExponential(significantDigits - 1).split('e')[1]) - significantDigits + 1;
  const tolerance = 0.5 * 10 ** power;
  const differenceLow = Math.abs(estimate - expandedUncertainty - drawn.symmetric.low);
  const differenceHigh = Math.abs(estimate + expandedUncertainty - drawn.symmetric.high);
  return { agrees: differenceLow <= tolerance && differenceHigh <= tolerance, differenceLow, differenceHigh, tolerance };
}
