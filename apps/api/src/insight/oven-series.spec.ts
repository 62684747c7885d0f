import { describe, expect, it } from 'vitest';
import { ovenChart } from './oven-chart.js';
import { ovenSeries, pointOf, type StripRow } from './oven-series.js';

const strip = (more: Partial<StripRow> = {}): StripRow => ({ jobId: 'job', number: 'J2026-0001', machine: 'Pump motor', stripId: '02', day: '2026-03-02', testId: '04', change: 0.01, repairId: null, tests: 1, ...more });

describe('what a strip says of its oven', () => {
  it.each([
    ['the first valid test after it', {}, { change: 0.01 }],
    ['nothing while there is no test', { testId: null, change: null, tests: 0 }, { reason: 'not-tested-yet' }],
    ['nothing where no test was valid', { testId: null, change: null, tests: 2 }, { reason: 'not-valid' }],
    ['nothing where there was no test before', { change: null }, { reason: 'increase-not-established' }],
    ['nothing where the core was repaired before it was tested', { repairId: '03' }, { reason: 'repaired-first' }],
    ['the same where it was repaired afterwards', { repairId: '05' }, { change: 0.01 }],
    ['nothing where it was repaired and not tested since', { repairId: '05', testId: null, change: null, tests: 0 }, { reason: 'repaired-first' }],
  ])('%s', (_words, more, expected) => {
    expect(pointOf(strip(more))).toEqual(expected);
  });
});

describe('the series of an oven', () => {
  const entry = (id: string, day: string, change: number) => ({ id, day, change, remark: '', by: 'Mo' });
  it('goes by days; of one day the older book comes first, then the jobs as they were written down', () => {
    const { points } = ovenSeries([strip({ stripId: '09', day: '2026-03-02', change: 0.3 }), strip({ stripId: '05', day: '2026-03-02', change: 0.2 }), strip({ stripId: '10', day: '2026-01-02', change: 0.05 })], [entry('12', '2026-03-02', 0.1), entry('11', '2025-12-01', 0)]);
    expect(points.map((p) => p.change)).toEqual([0, 0.05, 0.1, 0.2, 0.3]);
  });
  it('names what is left out and why', () => {
    const { points, leftOut } = ovenSeries([strip({ testId: null, change: null, tests: 1 })], []);
    expect(points).toEqual([]);
    expect(leftOut).toEqual([{ job: { id: 'job', number: 'J2026-0001', machine: 'Pump motor' }, day: '2026-03-02', reason: 'not-valid' }]);
  });
});

describe('the chart of an oven', () => {
  const series = (changes: readonly number[]) => changes.map((change, i) => ({ day: `2026-01-${String(i + 1).padStart(2, '0')}`, change, job: null, entry: null }));
  // NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.2: ten flow rates, limits 45.82 and 55.80 with the mean at 50.81 (standing as in the library: quoted in sources that were read)
  const FLOW = [49.6, 47.6, 49.9, 51.3, 47.8, 51.2, 52.6, 52.4, 53.6, 52.1];

  it('has the limits of the handbook’s example, here a hundredth of its figures', () => {
    const { chart } = ovenChart(series(FLOW.map((x) => x / 100)), 1, {});
    if (chart.outcome !== 'chart') throw new Error(chart.message);
    expect([chart.centre * 100, chart.lowerLimit * 100, chart.upperLimit * 100]).toEqual([expect.closeTo(50.81, 2), expect.closeTo(45.82, 1), expect.closeTo(55.8, 1)]);
    expect(chart.provisional).toBe(true);
  });
  it('says that seven jobs are too few, and still shows them', () => {
    const found = ovenChart(series([0, 0.01, 0, 0.02, 0.01, 0, 0.3]), 0.2, {});
    expect(found.chart).toMatchObject({ outcome: 'too-few-points', basePoints: 7 });
    expect([found.points.length, found.spokeAt, found.failedAt]).toEqual([7, null, 7]);
  });
  it('takes another base period where it is asked for, and refuses one outside', () => {
    const long = series([...Array.from({ length: 20 }, (_, i) => (i % 2) / 100), ...Array.from({ length: 10 }, (_, i) => 0.1 + (i % 2) / 100)]);
    expect(ovenChart(long, 0.2, {}).spokeAt).toBe(21);
    expect(ovenChart(long, 0.2, { baseFirst: 21, baseLast: 30 }).chart).toMatchObject({ centre: expect.closeTo(0.105, 9) });
    expect(() => ovenChart(long, 0.2, { baseFirst: 25, baseLast: 40 })).toThrow(/within the 30 points/);
  });
  it('of an oven without a job says what is missing', () => {
    expect(ovenChart([], 0.2, {})).toMatchObject({ chart: { outcome: 'too-few-points', basePoints: 0 }, points: [], spokeAt: null, failedAt: null });
  });
});
