import type { ChartPoint, IndividualsChart } from './individuals-chart.js';

/**
 * The first point after the base period at which the chart speaks: a run rule, or a step wider than the ranges allow.
 * Points within the base period are left out, since the limits were made from them.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `chart` | – | as `individualsChart` gives it |
 *
 * @returns the point, or undefined where the chart is silent
 *
 * Source: own.
 * @example
 * firstSignal(individualsChart([1, 2, 1, 2, 1, 2, 1, 2, 9], { basePeriod: { first: 1, last: 8 } })).position
 * // → 9
 */
export const firstSignal = (chart: IndividualsChart): ChartPoint | undefined =>
  chart.points.find((point) => point.position > chart.base.last && (point.hits.length > 0 || point.rangeBeyondLimit));
