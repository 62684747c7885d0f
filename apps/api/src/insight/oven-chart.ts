import { firstSignal, individualsChart, OutOfRangeError, RUN_RULES, SETTLED_BASE_POINTS, type BasePeriod, type ChartPoint, type IndividualsChart, type NoChart } from '@libs/control-charts';
import type { OvenChartQuery, OvenInsight, OvenPoint } from '@shared/insight';
import { AppError } from '../http/app-error.js';
import type { SeriesPoint } from './oven-series.js';

type Charted = Pick<OvenInsight, 'chart' | 'points' | 'spokeAt' | 'failedAt'>;

/** The chart of one oven: limits from its base period, every job held against them. */
export function ovenChart(series: readonly SeriesPoint[], increaseLimit: number, asked: OvenChartQuery): Charted {
  const chart = chartOf(series.map((p) => p.change), asked);
  const judged = chart.outcome === 'chart' ? chart.points : [];
  const points = series.map((point, i) => pointView(point, i + 1, increaseLimit, judged[i]));
  return {
    chart: chart.outcome === 'chart' ? limitsOf(chart) : { outcome: chart.outcome, message: chart.message, basePoints: chart.basePoints },
    points,
    spokeAt: chart.outcome === 'chart' ? (firstSignal(chart)?.position ?? null) : null,
    failedAt: points.find((p) => p.overLimit)?.position ?? null,
  };
}

function chartOf(series: readonly number[], { baseFirst, baseLast }: OvenChartQuery): IndividualsChart | NoChart {
  if (series.length === 0) return { outcome: 'too-few-points', message: 'No job of this oven has a valid test before and after yet.', basePoints: 0 };
  const basePeriod: BasePeriod = baseFirst !== undefined && baseLast !== undefined ? { first: baseFirst, last: baseLast } : { first: 1, last: Math.min(series.length, SETTLED_BASE_POINTS) };
  try {
    return individualsChart(series, { basePeriod });
  } catch (error) {
    if (!(error instanceof OutOfRangeError)) throw error;
    throw new AppError('INPUT_NOT_VALID', error.message, { fields: [{ path: 'baseLast', code: 'out-of-range', message: error.message }] });
  }
}

const limitsOf = ({ outcome, centre, sigma, lowerLimit, upperLimit, meanMovingRange, movingRangeLimit, base, provisional }: IndividualsChart) => ({
  outcome,
  centre,
  sigma,
  lowerLimit,
  upperLimit,
  meanMovingRange,
  movingRangeLimit,
  base: { ...base },
  provisional,
});

const WORDS = new Map(RUN_RULES.map((r) => [r.rule, r.words]));

function pointView(point: SeriesPoint, position: number, increaseLimit: number, judged: ChartPoint | undefined): OvenPoint {
  return {
    position,
    ...point,
    overLimit: point.change > increaseLimit,
    inBase: judged?.inBase ?? false,
    sigmas: judged?.sigmas ?? null,
    movingRange: judged?.movingRange ?? null,
    hits: (judged?.hits ?? []).map((rule) => ({ rule, words: WORDS.get(rule)! })),
    rangeBeyondLimit: judged?.rangeBeyondLimit ?? false,
  };
}
