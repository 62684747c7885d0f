import { OutOfRangeError } from './out-of-range-error.js';

/** One source of uncertainty: how far the result moves with it, and how uncertain it is itself. */
export interface Contribution {
  /** ∂f/∂x: change of the result per change of the source. */
  sensitivity: number;
  standardUncertainty: number;
}

const checked = ({ sensitivity, standardUncertainty }: Contribution): number => {
  if (!Number.isFinite(sensitivity)) throw new OutOfRangeError('sensitivity', 'A sensitivity must be a number.');
  if (!(Number.isFinite(standardUncertainty) && standardUncertainty >= 0)) {
    throw new OutOfRangeError('standardUncertainty', 'A standard uncertainty must be a number, 0 or more.');
  }
  return sensitivity * standardUncertainty;
};

/**
 * Combined standard uncertainty of sources that have nothing to do with each other.
 *
 * `u_c² = Σ (c_i·u_i)²`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | c_i | `contributions[i].sensitivity` | result per source | finite |
 * | u_i | `contributions[i].standardUncertainty` | of the source | 0 or more |
 *
 * @returns u_c, in the unit of the result; 0 when there are no sources
 * @throws OutOfRangeError outside those ranges
 *
 * Source: JCGM 100, law of propagation. Standing: from memory.
 * @example
 * combineUncorrelated([{ sensitivity: 1, standardUncertainty: 3 }, { sensitivity: -2, standardUncertainty: 2 }])
 * // → 5
 */
export const combineUncorrelated = (contributions: readonly Contribution[]): number => Math.hypot(...contributions.map(checked));

/**
 * Combined standard uncertainty of sources that move together. One instrument used twice is such a case: what it gets
 * wrong it gets wrong twice, and in a difference or a ratio that cancels.
 *
 * `u_c² = Σ_i Σ_j c_i·u_i·c_j·u_j·r_ij`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | c_i, u_i | `contributions[i]` | as `combineUncorrelated` | |
 * | r_ij | `correlation[i][j]` | – | −1 to 1, symmetric, 1 on the diagonal |
 *
 * @returns u_c, in the unit of the result
 * @throws OutOfRangeError when the table of correlations does not fit the sources or cannot exist
 *
 * Source: JCGM 100, law of propagation with correlated input. Standing: from memory.
 * @example
 * combineCorrelated([{ sensitivity: 1, standardUncertainty: 3 }, { sensitivity: -1, standardUncertainty: 2 }], [[1, 1], [1, 1]])
 * // → 1
 */
export function combineCorrelated(contributions: readonly Contribution[], correlation: readonly (readonly number[])[]): number {
  const parts = contributions.map(checked);
  const r = (i: number, j: number) => correlation[i]?.[j] ?? NaN;
  if (correlation.length !== parts.length || correlation.some((row) => row.length !== parts.length)) {
    throw new OutOfRangeError('correlation', 'The table of correlations needs one row and one column for each source.');
  }
  let variance = 0;
  parts.forEach((a, i) =>
    parts.forEach((b, j) => {
      const together = r(i, j);
      if (!(Math.abs(together) <= 1) || together !== r(j, i) || (i === j && together !== 1)) {
        throw new OutOfRangeError('correlation', 'Correlations run from −1 to 1, are the same both ways, and are 1 with themselves.');
      }
      variance += a * b * together;
    }),
  );
  const size = parts.reduce((sum, a) => sum + a * a, 0);
  if (variance < -1e-9 * size) throw new OutOfRangeError('correlation', 'These correlations contradict each other.');
  return Math.sqrt(Math.max(variance, 0));
}

/**
 * Expanded uncertainty.
 *
 * `U = k·u_c`, k = 2 for about 95 %
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | u_c | `standardUncertainty` | of the result | 0 or more |
 * | k | `coverageFactor` | – | more than 0 |
 *
 * @throws OutOfRangeError outside those ranges
 *
 * Source: JCGM 100. Standing: from memory.
 * @example
 * expanded(0.012)
 * // → 0.024
 */
export function expanded(standardUncertainty: number, coverageFactor = 2): number {
  if (!(Number.isFinite(coverageFactor) && coverageFactor > 0)) throw new OutOfRangeError('coverageFactor', 'The coverage factor must be more than 0.');
  return checked({ sensitivity: coverageFactor, standardUncertainty });
}
