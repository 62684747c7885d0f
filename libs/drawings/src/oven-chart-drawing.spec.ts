import { individualsChart, RUN_RULES } from '@libs/control-charts';
import { describe, expect, it } from 'vitest';
import { faultsOf, outOfFrame, wordsOf } from './drawn-extent.fixture.js';
import { ovenChartDrawing, type OvenChartInput } from './oven-chart-drawing.js';
import { overlapping } from './overlapping-words.fixture.js';

// Source: the second oven of the sample shop, change of core loss in %; invented figures.
const BASE = [-2.2, -0.8, -3.0, 0.4, -1.4, -2.7, -0.3, -1.8, 0.9, -2.1, -1.1, -3.3, -0.5, -1.6, 0.2, -2.4, -0.9, -1.3, 0.7, -2.0];
const NEXT = [0.9, 1.8, 0.6, 2.4, 3.1, 4.9, 6.8, 9.7];

function input(series: readonly number[], over: Partial<OvenChartInput> = {}): OvenChartInput {
  const chart = individualsChart(series, { basePeriod: { first: 1, last: 20 } });
  if (chart.outcome !== 'chart') throw new Error(chart.message);
  const points = chart.points.map((p) => ({ ...p, hits: p.hits.map((rule) => RUN_RULES.find((r) => r.rule === rule)!.words) }));
  return { ...chart, points, baseLast: 20, unit: '%', ...over };
}
const steady = ovenChartDrawing(input(BASE));
const drifting = ovenChartDrawing(input([...BASE, ...NEXT]));
const failed = ovenChartDrawing(input([...BASE, ...NEXT, 61.2, 18.6]));
const marksOf = (drawing: typeof steady, kind: 'rect' | 'circle') => drawing.shapes.filter((s) => s.kind === kind && s.mark !== undefined);
const diamonds = (drawing: typeof steady) => drawing.shapes.filter((s) => s.kind === 'path' && s.mark !== undefined && s.fill === 'card');

describe('ovenChartDrawing', () => {
  it('marks the points of a pattern by another shape and says in words where each was first seen', () => {
    expect(diamonds(drifting).map((s) => s.mark)).toEqual(['job-23', 'job-24', 'job-25', 'job-26', 'job-27']);
    expect(wordsOf(drifting)).toContain('job 25, +3.10 %: 2 of 3 beyond 2 sigma, same side.');
    expect(wordsOf(drifting)).toContain('job 26, +4.90 %: one point beyond 3 sigma.');
    expect(wordsOf(drifting)).toContain('job 28, +9.70 %: 8 in a row on one side.');
  });
  it('says that a steady oven is steady', () => {
    expect(wordsOf(steady)).toContain('No pattern: the oven keeps as it was.');
    expect(diamonds(steady)).toEqual([]);
    expect(marksOf(steady, 'circle')).toHaveLength(20 + 19);
  });
  it('marks a step that is too wide on the lower chart by a square', () => {
    expect(marksOf(failed, 'rect').map((s) => s.mark)).toEqual(['job-29', 'job-30']);
    expect(wordsOf(failed)).toContain('job 29, +61.20 %: step wider than usual.');
  });
  it('keeps a point far beyond the limits at the edge, with its figure below', () => {
    expect(wordsOf(failed)).toContain('Triangles, beyond the scale: job 28 +9.70 %, job 29 +61.20 %, job 30 +18.60 %.');
    const triangles = failed.shapes.filter((s) => s.kind === 'path' && s.mark !== undefined && s.fill === 'fails');
    expect(triangles.map((s) => s.mark)).toEqual(['job-28', 'job-29', 'job-30']);
  });
  it('writes the limits beside their lines', () => {
    expect(wordsOf(drifting)).toEqual(expect.arrayContaining(['+4.03', '−1.26', '−6.55', '6.50', '1.99']));
  });
  it('says from which jobs the limits were made', () => {
    expect(wordsOf(steady)).toContain('limits from all of these');
    expect(wordsOf(drifting)).toContain('limits from these | since then');
  });
  it('has the figures behind it, row by row', () => {
    expect(drifting.table?.rows).toHaveLength(28);
    expect(drifting.table?.rows[0]).toEqual(['job 1', '−2.20', '–', '–']);
    expect(drifting.table?.rows[25]?.[3]).toContain('one point beyond 3 sigma');
    expect(drifting.description).toContain('28 jobs, mean −1.26 %, limits −6.55 to +4.03 %.');
  });
  it('calls jobs by their own name where they have one', () => {
    const named = input([...BASE, ...NEXT]);
    const drawing = ovenChartDrawing({ ...named, points: named.points.map((p, i) => ({ ...p, label: `RW-${100 + i}` })) });
    expect(wordsOf(drawing)).toContain('RW-125, +4.90 %: one point beyond 3 sigma.');
  });
  it('keeps its words inside the frame, wide and on a phone', () => {
    for (const series of [BASE, [...BASE, ...NEXT], [...BASE, ...NEXT, 61.2, 18.6], [...BASE, -61.2], [...BASE, ...Array.from({ length: 40 }, () => 30)]]) {
      for (const narrow of [false, true]) {
        const drawing = ovenChartDrawing(input(series, { narrow }));
        expect(outOfFrame(drawing)).toEqual([]);
        expect(overlapping(drawing)).toEqual([]);
        expect(faultsOf(drawing.shapes)).toEqual([]);
      }
    }
  });
  it('says so where there is no job yet, and refuses a figure that is no number', () => {
    expect(wordsOf(ovenChartDrawing(input(BASE, { points: [] })))).toEqual(['No jobs of this oven yet.']);
    expect(() => ovenChartDrawing(input(BASE, { centre: Number.NaN }))).toThrow(RangeError);
  });
});
