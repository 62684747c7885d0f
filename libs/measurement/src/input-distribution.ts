import { normalShareBelow } from './conformance-probability.js';
import { OutOfRangeError } from './out-of-range-error.js';
import { standardFromLimits } from './standard-uncertainty.js';

/** What is known about one input: its best estimate, and how it may lie about it. */
export type InputDistribution =
  | { kind: 'normal'; estimate: number; standardUncertainty: number }
  /** Anywhere within ± the half-width, all places alike: a limit of error. */
  | { kind: 'rectangular'; estimate: number; halfWidth: number }
  /** Swings like a sine between the ends: a temperature that cycles, an angle of unknown phase. */
  | { kind: 'arcsine'; estimate: number; halfWidth: number };

export type DistributionKind = InputDistribution['kind'];

/** Refuses an input that cannot be. */
export function checkedInput(input: InputDistribution): InputDistribution {
  const width = input.kind === 'normal' ? input.standardUncertainty : input.halfWidth;
  if (!Number.isFinite(input.estimate)) throw new OutOfRangeError('estimate', 'An estimate must be a number.');
  if (!(Number.isFinite(width) && width >= 0)) {
    throw new OutOfRangeError(input.kind === 'normal' ? 'standardUncertainty' : 'halfWidth', 'The width of an input must be a number, 0 or more.');
  }
  return input;
}

/**
 * Standard uncertainty of an input, for the law of propagation.
 *
 * `u` (normal), `a/√3` (rectangular), `a/√2` (arcsine)
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | u | `input.standardUncertainty` | of the input | 0 or more |
 * | a | `input.halfWidth` | of the input | 0 or more |
 *
 * @returns of the input
 * @throws OutOfRangeError outside those ranges
 *
 * Source: JCGM 100 clause 4.3, JCGM 101 clause 6.4. Standing: from memory.
 * @example
 * standardOfInput({ kind: 'arcsine', estimate: 20, halfWidth: 0.5 })
 * // → 0.354
 */
export function standardOfInput(input: InputDistribution): number {
  checkedInput(input);
  if (input.kind === 'normal') return input.standardUncertainty;
  return input.kind === 'rectangular' ? standardFromLimits(input.halfWidth) : input.halfWidth / Math.SQRT2;
}

/** The shape of a kind with mean 0 and standard uncertainty 1, as a rising function of a normal score z. */
export function shapeAt(kind: DistributionKind, z: number): number {
  if (kind === 'normal') return z;
  const centred = normalShareBelow(z) - 0.5;
  return kind === 'rectangular' ? Math.sqrt(12) * centred : Math.SQRT2 * Math.sin(Math.PI * centred);
}

/** The same from a number between 0 and 1, where no normal score is needed. */
export function shapeOfShare(kind: 'rectangular' | 'arcsine', share: number): number {
  return kind === 'rectangular' ? Math.sqrt(12) * (share - 0.5) : Math.SQRT2 * Math.sin(Math.PI * (share - 0.5));
}
