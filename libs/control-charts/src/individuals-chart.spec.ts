import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { firstSignal } from './first-signal.js';
import { individualsChart, type BasePeriod, type IndividualsChart } from './individuals-chart.js';
import { OutOfRangeError } from './out-of-range-error.js';
import type { RunRule } from './run-rules.js';

function chartOf(series: readonly number[], basePeriod?: BasePeriod): IndividualsChart {
  const chart = individualsChart(series, basePeriod ? { basePeriod } : {});
  if (chart.outcome !== 'chart') throw new Error(chart.message);
  return chart;
}

// Source: NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.2 "Individuals Control Charts", flow rate of ten batches.
// Standing: data and printed results quoted, alike, in several public sources that were read; the page itself was not.
describe('The published example of ten flow rates', () => {
  const flow = chartOf([49.6, 47.6, 49.9, 51.3, 47.8, 51.2, 52.6, 52.4, 53.6, 52.1]);
  it('gives the printed moving ranges and their mean, 1.8778', () => {
    expect(flow.points.map((p) => p.movingRange && Number(p.movingRange.toFixed(4)))).toEqual([null, 2, 2.3, 1.4, 3.5, 3.4, 1.4, 0.2, 1.2, 1.5]);
    expect(flow.meanMovingRange).toBeCloseTo(1.8778, 4);
  });
  it('gives the printed centre line and limits: 50.81, 55.8041, 45.8159', () => {
    expect(flow.centre).toBeCloseTo(50.81, 10);
    expect(flow.upperLimit).toBeCloseTo(55.8041, 4);
    expect(flow.lowerLimit).toBeCloseTo(45.8159, 4);
  });
  it('is in control, as printed: no point beyond a limit', () => {
    expect(flow.points.some((p) => p.hits.includes('one-beyond-3-sigma') || p.rangeBeyondLimit)).toBe(false);
  });
  it('rests on ten points only, and says that its limits are a first estimate', () => {
    expect(flow.provisional).toBe(true);
  });
});

// Source: the sample shop's two ovens, core loss change in % job by job; invented figures, limits computed beforehand by another program.
const OVEN_1 = [-3.1, -0.4, -1.9, 0.8, -2.6, -0.9, -3.4, 0.3, -1.2, -2.0, 0.6, -1.7, -2.9, -0.6, -2.3, 1.3, -4.0, -1.2, -2.1, -1.8];
const OVEN_2 = [-2.2, -0.8, -3.0, 0.4, -1.4, -2.7, -0.3, -1.8, 0.9, -2.1, -1.1, -3.3, -0.5, -1.6, 0.2, -2.4, -0.9, -1.3, 0.7, -2.0];
const OVEN_2_NEXT = [0.9, 1.8, 0.6, 2.4, 3.1, 4.9, 6.8, 9.7];
const FIRST_FAILED_CORE = 61.2;

describe('The two burnout ovens', () => {
  it('oven 1: mean −1.455 %, mean moving range 2.289, limits −7.54 and +4.63, range limit 7.48', () => {
    const oven = chartOf(OVEN_1);
    expect(oven.centre).toBeCloseTo(-1.455, 10);
    expect(oven.meanMovingRange).toBeCloseTo(2.289, 3);
    expect([oven.lowerLimit.toFixed(2), oven.upperLimit.toFixed(2), oven.movingRangeLimit.toFixed(2)]).toEqual(['-7.54', '4.63', '7.48']);
    expect(oven.provisional).toBe(false);
  });
  it('oven 1 keeps steady through its twenty jobs', () => {
    expect(chartOf(OVEN_1).points.flatMap((p) => p.hits)).toEqual([]);
  });
  it('oven 2: mean −1.260 %, mean moving range 1.989, sigma 1.764, limits −6.55 and +4.03, range limit 6.50', () => {
    const oven = chartOf(OVEN_2);
    expect(oven.centre).toBeCloseTo(-1.26, 10);
    expect(oven.meanMovingRange).toBeCloseTo(1.989, 3);
    expect(oven.sigma).toBeCloseTo(1.764, 3);
    expect([oven.lowerLimit.toFixed(2), oven.upperLimit.toFixed(2), oven.movingRangeLimit.toFixed(2)]).toEqual(['-6.55', '4.03', '6.50']);
  });

  const drifting = chartOf([...OVEN_2, ...OVEN_2_NEXT, FIRST_FAILED_CORE, 18.6], { first: 1, last: 20 });
  const firstOf = (rule: RunRule) => (drifting.points.find((p) => !p.inBase && p.hits.includes(rule))?.position ?? NaN) - 20;
  it.each([
    ['two-of-three-beyond-2-sigma', 5, 3.1],
    ['one-beyond-3-sigma', 6, 4.9],
    ['eight-on-one-side', 8, 9.7],
    ['four-of-five-beyond-1-sigma', 3, 0.6],
    ['six-rising', 8, 9.7],
  ] as const)('oven 2, after its base period: %s first at job %d, %d %%', (rule, job, percent) => {
    expect(firstOf(rule)).toBe(job);
    expect(OVEN_2_NEXT[job - 1]).toBe(percent);
  });
  it('keeps the base limits while the oven drifts', () => {
    expect(drifting.upperLimit).toBe(chartOf(OVEN_2).upperLimit);
  });
  it('speaks before the first core fails the 20 % limit', () => {
    const failed = drifting.points.findIndex((p) => p.value > 20) + 1;
    expect(failed - 20).toBe(9);
    expect(firstSignal(drifting)!.position).toBeLessThan(failed);
    expect(drifting.points.filter((p) => p.position < failed && p.value > drifting.upperLimit)).toHaveLength(3);
  });
  it('marks the jump to 61.2 % on the range chart too', () => {
    expect(drifting.points.filter((p) => p.rangeBeyondLimit).map((p) => p.position)).toEqual([29, 30]);
  });
  it('has no first signal where nothing came after the base period', () => {
    expect(firstSignal(chartOf(OVEN_1))).toBeUndefined();
  });
});

describe('A chart that cannot be made', () => {
  it('says how many points it needs', () => {
    expect(individualsChart([1, 2, 3, 4, 5, 6, 7])).toEqual({ outcome: 'too-few-points', message: 'A chart needs at least 8 points to say what is usual; there are 7.', basePoints: 7 });
    expect(individualsChart([]).outcome).toBe('too-few-points');
    expect(individualsChart([3])).toMatchObject({ message: expect.stringContaining('there is 1') });
    expect(individualsChart(OVEN_1, { basePeriod: { first: 4, last: 10 } }).outcome).toBe('too-few-points');
  });
  it('says so where every point is the same', () => {
    expect(individualsChart(Array.from({ length: 12 }, () => 2.5))).toMatchObject({ outcome: 'no-variation', basePoints: 12 });
  });
  it('names the point that is no number', () => {
    expect(() => individualsChart([1, 2, Number.NaN])).toThrow(/Point 3/);
    expect(() => individualsChart([Infinity])).toThrow(OutOfRangeError);
  });
  it.each([{ first: 0, last: 10 }, { first: 5, last: 4 }, { first: 1, last: 21 }, { first: 1.5, last: 12 }, { first: NaN, last: 12 }])('refuses the base period $first to $last', (basePeriod) => {
    expect(() => individualsChart(OVEN_1, { basePeriod })).toThrow(OutOfRangeError);
  });
});

describe('Any chart', () => {
  const series = fc.array(fc.integer({ min: -500, max: 500 }), { minLength: 8, maxLength: 40 }).filter((xs) => new Set(xs).size > 1);
  it('moves with its points and stretches with their unit', () => {
    fc.assert(
      fc.property(series, fc.integer({ min: -1000, max: 1000 }), fc.integer({ min: 1, max: 16 }), (xs, shift, scale) => {
        const plain = chartOf(xs);
        const moved = chartOf(xs.map((x) => x * scale + shift));
        expect(moved.centre).toBeCloseTo(plain.centre * scale + shift, 6);
        expect(moved.upperLimit).toBeCloseTo(plain.upperLimit * scale + shift, 6);
        expect(moved.movingRangeLimit).toBeCloseTo(plain.movingRangeLimit * scale, 6);
      }),
    );
  });
  it('puts a point that equals the mean on neither side, whatever the sum of decimals makes of it', () => {
    const chart = chartOf([0.1, 0.3, 0.1, 0.3, 0.1, 0.3, 0.1, 0.3, 0.2], { first: 1, last: 8 });
    expect(chart.points.at(-1)!.sigmas).toBe(0);
  });
  it('has its limits evenly about the centre, three sigmas away', () => {
    fc.assert(
      fc.property(series, (xs) => {
        const chart = chartOf(xs);
        expect(chart.upperLimit - chart.centre).toBeCloseTo(3 * chart.sigma, 8);
        expect((chart.centre - chart.lowerLimit) / chart.meanMovingRange).toBeCloseTo(2.66, 3);
        for (const p of chart.points) expect(p.hits.includes('one-beyond-3-sigma')).toBe(Math.abs(p.sigmas) > 3);
      }),
    );
  });
});
