import { combineUncorrelated, type Contribution } from './combined-uncertainty.js';
import { OutOfRangeError } from './out-of-range-error.js';

/** A source whose own uncertainty is known only so well: n − 1 for the mean of n readings, Infinity for a firm limit. */
export interface ContributionWithDegrees extends Contribution {
  degreesOfFreedom: number;
}

/**
 * Effective degrees of freedom of a combined uncertainty: how well it is known itself.
 *
 * `ν_eff = u_c⁴ / Σ (c_i·u_i)⁴/ν_i` (Welch and Satterthwaite)
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | c_i, u_i | `contributions[i]` | as `combineUncorrelated` | |
 * | ν_i | `contributions[i].degreesOfFreedom` | – | more than 0; Infinity for a source known surely |
 *
 * It holds for sources that have nothing to do with each other.
 *
 * @returns ν_eff; Infinity when every source that counts is known surely
 * @throws OutOfRangeError outside those ranges, or when nothing is uncertain
 *
 * Source: JCGM 100 annex G.4. Standing: from memory.
 * @example
 * effectiveDegreesOfFreedom([{ sensitivity: 1, standardUncertainty: 0.25, degreesOfFreedom: 9 }, { sensitivity: 1, standardUncertainty: 0.57, degreesOfFreedom: 4 }, { sensitivity: 1, standardUncertainty: 0.82, degreesOfFreedom: 14 }])
 * // → 19.0
 */
export function effectiveDegreesOfFreedom(contributions: readonly ContributionWithDegrees[]): number {
  const combined = combineUncorrelated(contributions);
  if (combined === 0) throw new OutOfRangeError('contributions', 'Nothing here is uncertain, so there is nothing to count degrees of freedom for.');
  const spread = contributions.reduce((sum, { sensitivity, standardUncertainty, degreesOfFreedom }) => {
    if (!(degreesOfFreedom > 0)) throw new OutOfRangeError('degreesOfFreedom', 'The degrees of freedom must be more than 0; without end is allowed.');
    return sum + ((sensitivity * standardUncertainty) / combined) ** 4 / degreesOfFreedom;
  }, 0);
  return 1 / spread;
}
