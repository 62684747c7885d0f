import { OutOfRangeError } from './out-of-range-error.js';

/** What the maker says about an instrument: every part that is stated counts. */
export interface InstrumentStatement {
  /** Limit of error, percent of the reading. */
  percentOfReading?: number;
  /** Limit of error, percent of the range's end value. */
  percentOfRange?: number;
  /** Accuracy class of IEC 60051: limit of error, percent of the range's end value. */
  accuracyClass?: number;
  /** Limit of error in steps of the last digit; needs `resolution`. */
  digits?: number;
  /** One step of the last digit, or what can be read off a scale, in the unit of the reading. */
  resolution?: number;
  /** End value of the range, in the unit of the reading; needed with `percentOfRange` and `accuracyClass`. */
  range?: number;
}

const atLeastZero = (value: number, field: string): number => {
  if (!(Number.isFinite(value) && value >= 0)) throw new OutOfRangeError(field, `${field} must be a number, 0 or more.`);
  return value;
};

/**
 * Standard uncertainty of a value known only to lie within ± a half-width, all places alike.
 *
 * `u = a / √3`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | a | `halfWidth` | of the value | 0 or more |
 *
 * @returns u, in the unit of the value
 * @throws OutOfRangeError when the half-width is negative or not finite
 *
 * Source: JCGM 100 (GUM), type B evaluation, rectangular distribution. Standing: from memory.
 * @example
 * standardFromLimits(1)
 * // → 0.57735
 */
export const standardFromLimits = (halfWidth: number): number => atLeastZero(halfWidth, 'halfWidth') / Math.sqrt(3);

/**
 * Standard uncertainty from an expanded one, as a calibration certificate states it.
 *
 * `u = U / k`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U | `expandedUncertainty` | of the value | 0 or more |
 * | k | `coverageFactor` | – | more than 0 |
 *
 * @throws OutOfRangeError outside those ranges
 *
 * Source: JCGM 100. Standing: from memory.
 * @example
 * standardFromExpanded(0.5, 2)
 * // → 0.25
 */
export function standardFromExpanded(expandedUncertainty: number, coverageFactor = 2): number {
  if (!(Number.isFinite(coverageFactor) && coverageFactor > 0)) throw new OutOfRangeError('coverageFactor', 'The coverage factor must be more than 0.');
  return atLeastZero(expandedUncertainty, 'expandedUncertainty') / coverageFactor;
}

/**
 * Standard uncertainty of the mean of repeated readings.
 *
 * `u = s / √n`, `s² = Σ(x − x̄)² / (n − 1)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | x | `readings` | any | at least two, all finite |
 *
 * @throws OutOfRangeError when there are fewer than two readings or one is not finite
 *
 * Source: JCGM 100, type A evaluation. Standing: from memory.
 * @example
 * standardFromRepeats([10.1, 10.3, 10.2])
 * // → 0.0577
 */
export function standardFromRepeats(readings: readonly number[]): number {
  if (readings.length < 2 || !readings.every(Number.isFinite)) throw new OutOfRangeError('readings', 'At least two readings are needed, all of them numbers.');
  const mean = readings.reduce((sum, x) => sum + x, 0) / readings.length;
  const squares = readings.reduce((sum, x) => sum + (x - mean) ** 2, 0);
  return Math.sqrt(squares / (readings.length - 1) / readings.length);
}

/**
 * Standard uncertainty of a reading from what the maker says about the instrument. The stated limits add up to one
 * limit of error e, taken as rectangular; the resolution is a rectangle of its own.
 *
 * `e = p_r·|x|/100 + (p_R + C)·R/100 + n·d`, `u² = (e/√3)² + (d/√12)²`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | x | `reading` | any | finite |
 * | p_r | `statement.percentOfReading` | % | 0 or more |
 * | p_R | `statement.percentOfRange` | % | 0 or more |
 * | C | `statement.accuracyClass` | % of range | 0 or more |
 * | n | `statement.digits` | steps | 0 or more |
 * | d | `statement.resolution` | of the reading | 0 or more |
 * | R | `statement.range` | of the reading | more than 0 when p_R or C is given |
 *
 * @returns u, in the unit of the reading
 * @throws OutOfRangeError when the statement is empty, a part is negative, or a part lacks what it refers to
 *
 * Source: JCGM 100 type B; classes of IEC 60051. Standing: from memory.
 * @example
 * standardFromInstrument({ accuracyClass: 0.5, range: 300 }, 150)
 * // → 0.866
 */
export function standardFromInstrument(statement: InstrumentStatement, reading: number): number {
  if (!Number.isFinite(reading)) throw new OutOfRangeError('reading', 'The reading must be a number.');
  const { percentOfReading, percentOfRange, accuracyClass, digits, resolution, range } = statement;
  if ([percentOfReading, percentOfRange, accuracyClass, digits, resolution].every((part) => part === undefined)) {
    throw new OutOfRangeError('statement', 'The instrument says nothing about its error: enter its class, percentages or digits.');
  }
  const share = atLeastZero(percentOfRange ?? 0, 'percentOfRange') + atLeastZero(accuracyClass ?? 0, 'accuracyClass');
  if (share > 0 && !(range !== undefined && Number.isFinite(range) && range > 0)) {
    throw new OutOfRangeError('range', 'A class or a percentage of range needs the end value of the range.');
  }
  if ((digits ?? 0) > 0 && !(resolution !== undefined && resolution > 0)) {
    throw new OutOfRangeError('resolution', 'An error in digits needs the step of the last digit.');
  }
  const step = atLeastZero(resolution ?? 0, 'resolution');
  const limit =
    (atLeastZero(percentOfReading ?? 0, 'percentOfReading') * Math.abs(reading)) / 100 + (share * (range ?? 0)) / 100 + atLeastZero(digits ?? 0, 'digits') * step;
  return Math.hypot(limit / Math.sqrt(3), step / Math.sqrt(12));
}
