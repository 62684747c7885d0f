import { individualsChart, RUN_RULES } from '@libs/control-charts';
import type { OvenInsight } from '@shared/insight';

// the second oven of the sample shop, change of core loss in percent; invented figures
const OLDER_BOOK = [-2.2, -0.8, -3.0, 0.4, -1.4, -2.7, -0.3, -1.8, 0.9, -2.1, -1.1, -3.3, -0.5, -1.6, 0.2, -2.4, -0.9, -1.3, 0.7, -2.0, 0.9, 1.8, 0.6, 2.4, 3.1, 4.9, 6.8, 9.7];
const JOBS = [['J2026-0004', 61.2], ['J2026-0009', 18.6]] as const;
const day = (position: number) => new Date(Date.UTC(2026, 5, 1 + position * 5)).toISOString().slice(0, 10);

/** An oven's answer as the server gives it, from a series in percent. */
export function ovenOf(book: readonly number[], jobs: readonly (readonly [string, number])[] = [], more: Partial<OvenInsight> = {}): OvenInsight {
  const series = [...book, ...jobs.map(([, percent]) => percent)].map((percent) => percent / 100);
  const chart = individualsChart(series, { basePeriod: { first: 1, last: Math.min(20, series.length) } });
  if (chart.outcome !== 'chart') throw new Error(chart.message);
  const { points, ...limits } = chart;
  const overLimit = (change: number) => change > 0.2;
  return {
    oven: { id: 'O2', name: 'O2', remark: '' },
    increaseLimit: 0.2,
    chart: { ...limits, base: { ...limits.base } },
    points: points.map((p) => {
      const job = jobs[p.position - 1 - book.length];
      return {
        position: p.position,
        day: day(p.position),
        change: p.value,
        job: job ? { id: `job-${job[0].toLowerCase()}`, number: job[0], machine: 'saw motor' } : null,
        entry: job ? null : { id: `entry-000${p.position}`, remark: 'paper book', by: 'Rolf Steenbeck' },
        overLimit: overLimit(p.value),
        inBase: p.inBase,
        sigmas: p.sigmas,
        movingRange: p.movingRange,
        hits: p.hits.map((rule) => ({ rule, words: RUN_RULES.find((r) => r.rule === rule)!.words })),
        rangeBeyondLimit: p.rangeBeyondLimit,
      };
    }),
    spokeAt: points.find((p) => p.position > chart.base.last && (p.hits.length > 0 || p.rangeBeyondLimit))?.position ?? null,
    failedAt: points.find((p) => overLimit(p.value))?.position ?? null,
    leftOut: [],
    rules: RUN_RULES.map(({ rule, words, source, standing }) => ({ rule, words, source, standing })),
    ...more,
  };
}
export const drifting = ovenOf(OLDER_BOOK, JOBS);
export const steady = ovenOf(OLDER_BOOK.slice(0, 20));
