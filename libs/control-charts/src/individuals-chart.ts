import { D2_OF_TWO, D4_OF_TWO, FEWEST_BASE_POINTS, SETTLED_BASE_POINTS } from './chart-constants.js';
import { OutOfRangeError } from './out-of-range-error.js';
import { rulesCompletedAt, type RunRule } from './run-rules.js';

/** Positions count from 1, both ends included. */
export interface BasePeriod {
  readonly first: number;
  readonly last: number;
}

export interface ChartPoint {
  /** 1 for the first of the series */
  readonly position: number;
  readonly value: number;
  /** distance from the centre line */
  readonly sigmas: number;
  /** to the point before; null for the first */
  readonly movingRange: number | null;
  readonly inBase: boolean;
  /** patterns this point completes */
  readonly hits: readonly RunRule[];
  /** the step to this point is wider than the moving-range chart allows */
  readonly rangeBeyondLimit: boolean;
}

export interface IndividualsChart {
  readonly outcome: 'chart';
  readonly centre: number;
  readonly sigma: number;
  readonly lowerLimit: number;
  readonly upperLimit: number;
  readonly meanMovingRange: number;
  readonly movingRangeLimit: number;
  readonly base: BasePeriod;
  /** the base period is short: the limits are a first estimate */
  readonly provisional: boolean;
  readonly points: readonly ChartPoint[];
}

/** Why there is no chart; `message` says what to do. */
export interface NoChart {
  readonly outcome: 'too-few-points' | 'no-variation';
  readonly message: string;
  readonly basePoints: number;
}

/**
 * Individuals and moving-range chart: is this job like the jobs before it?
 *
 * `CL = Σx/n` `MR_i = |x_i − x_(i−1)|` `σ = MR̄/1.128` `limits CL ± 3σ` (3/1.128 is often printed as 2.66) `MR limit = 3.267·MR̄`
 *
 * Centre and sigma come from the base period alone, moving ranges within it; every point of the series is judged against them.
 * Runs are followed across the whole series.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | x_i | `series[i]` | any, one for all | finite, in time order |
 * | – | `options.basePeriod` | positions from 1 | within the series; all of it unless told |
 *
 * @returns the chart; `too-few-points` under 8 points in the base period; `no-variation` where they are all the same
 * @throws OutOfRangeError when a point is no number, or the base period does not lie within the series
 *
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.2. Standing: quoted in sources that were read.
 * @example
 * individualsChart([49.6, 47.6, 49.9, 51.3, 47.8, 51.2, 52.6, 52.4, 53.6, 52.1]).upperLimit
 * // → 55.8041
 */
export function individualsChart(series: readonly number[], options: { readonly basePeriod?: BasePeriod } = {}): IndividualsChart | NoChart {
  series.forEach((x, i) => {
    if (!Number.isFinite(x)) throw new OutOfRangeError('series', `Point ${i + 1} is no number. Leave it out, or enter it again.`);
  });
  const base = checkedBase(series.length, options.basePeriod);
  const inBase = base.last - base.first + 1;
  if (inBase < FEWEST_BASE_POINTS) {
    const message = `A chart needs at least ${FEWEST_BASE_POINTS} points to say what is usual; there ${inBase === 1 ? 'is' : 'are'} ${inBase}.`;
    return { outcome: 'too-few-points', message, basePoints: inBase };
  }
  const usual = series.slice(base.first - 1, base.last);
  const centre = usual[0]! + mean(usual.map((x) => x - usual[0]!));
  const meanMovingRange = mean(rangesOf(usual));
  if (meanMovingRange === 0) {
    return { outcome: 'no-variation', message: 'All points of the base period are the same: the scatter cannot be told. Check how they were read.', basePoints: inBase };
  }
  const sigma = meanMovingRange / D2_OF_TWO;
  const movingRangeLimit = D4_OF_TWO * meanMovingRange;
  // nine places: a point on the centre line or on a limit stays on it, whatever binary makes of its decimals
  const deviations = series.map((x) => Math.round(((x - centre) / sigma) * 1e9) / 1e9 + 0);
  const points = series.map((value, i): ChartPoint => {
    const movingRange = i === 0 ? null : Math.abs(value - series[i - 1]!);
    return {
      position: i + 1,
      value,
      sigmas: deviations[i]!,
      movingRange,
      inBase: i + 1 >= base.first && i + 1 <= base.last,
      hits: rulesCompletedAt(deviations, i),
      rangeBeyondLimit: movingRange !== null && movingRange > movingRangeLimit,
    };
  });
  return {
    outcome: 'chart',
    centre,
    sigma,
    lowerLimit: centre - 3 * sigma,
    upperLimit: centre + 3 * sigma,
    meanMovingRange,
    movingRangeLimit,
    base,
    provisional: inBase < SETTLED_BASE_POINTS,
    points,
  };
}

const mean = (values: readonly number[]) => values.reduce((sum, x) => sum + x, 0) / values.length;
const rangesOf = (values: readonly number[]) => values.slice(1).map((x, i) => Math.abs(x - values[i]!));

function checkedBase(length: number, asked: BasePeriod | undefined): BasePeriod {
  if (!asked) return { first: 1, last: length };
  const whole = Number.isInteger(asked.first) && Number.isInteger(asked.last);
  if (!whole || asked.first < 1 || asked.last < asked.first || asked.last > length) {
    throw new OutOfRangeError('basePeriod', `The base period must lie within the ${length} points of the series.`);
  }
  return { first: asked.first, last: asked.last };
}
