import type { Drawing, Shape } from './drawing.js';
import { lineTo, moveTo, type Point } from './pen.js';
import { across, brokenWords, label, plotOf, polyline, type Plot } from './plot-frame.js';

export interface OvenChartPoint {
  /** what stands for the point in words, such as 'job 12'; its position where it is left out */
  readonly label?: string;
  readonly value: number;
  /** to the point before; null for the first */
  readonly movingRange: number | null;
  /** patterns the point completes, in words */
  readonly hits: readonly string[];
  readonly rangeBeyondLimit: boolean;
}

export interface OvenChartInput {
  readonly points: readonly OvenChartPoint[];
  readonly centre: number;
  readonly lowerLimit: number;
  readonly upperLimit: number;
  readonly meanMovingRange: number;
  readonly movingRangeLimit: number;
  /** position of the last point the limits were made from, counted from 1 */
  readonly baseLast: number;
  /** of value and range, such as '%' */
  readonly unit: string;
  readonly title?: string;
  /** for a phone: 340 units wide */
  readonly narrow?: boolean;
}

const RANGE_WORDS = 'step wider than usual';
const [TOP, MIDDLE, UPPER_HEIGHT, LOWER_HEIGHT] = [24, 34, 150, 70];
const LINE = 15;
const MOST_NAMED = 6;

/**
 * Is this oven like it was? Individuals above, moving ranges below, each with its limits. A point that completes a pattern is
 * a diamond, a step too wide a square, and both are named in words below. A point far beyond the limits stands at the edge as a
 * triangle, with its figure below, so that the others keep their shape.
 *
 * @returns a drawing 560 units wide, 340 where `narrow`; without points a drawing that says so.
 * @throws {RangeError} when a figure is no number.
 *
 * Source: own drawing.
 */
export function ovenChartDrawing(input: OvenChartInput): Drawing {
  const width = input.narrow ? 340 : 560;
  const title = input.title ?? 'Oven, job by job';
  if (input.points.length === 0) {
    const words = 'No jobs of this oven yet.';
    return { width, height: 60, title, description: words, shapes: [label(0, 34, words, 'start', 'muted', 13)] };
  }
  const [left, right] = [6, width - 46];
  const jobs = { from: 0.5, to: input.points.length + 0.5 };
  const reach = (input.upperLimit - input.centre) * 2;
  const upper = plotOf({ left, right, top: TOP, bottom: TOP + UPPER_HEIGHT }, jobs, { from: input.centre - reach, to: input.centre + reach });
  const lower = plotOf({ left, right, top: upper.bottom + MIDDLE, bottom: upper.bottom + MIDDLE + LOWER_HEIGHT }, jobs, { from: 0, to: input.movingRangeLimit * 1.5 });
  const lines = [...spoken(input), ...offScale(input, upper)].flatMap((words) => brokenWords(words, Math.floor(width / 6.6)));
  const wordsFrom = lower.bottom + 38;
  return {
    width,
    height: wordsFrom + lines.length * LINE,
    title,
    description: [`${input.points.length} jobs, mean ${figure(input.centre, input.unit)}, limits ${figure(input.lowerLimit)} to ${figure(input.upperLimit, input.unit)}.`, ...spoken(input)].join(' '),
    shapes: [...frame(input, upper, lower), ...individuals(input, upper), ...ranges(input, lower), ...lines.map((text, i) => label(0, wordsFrom + i * LINE, text, 'start', 'text', 12))],
    table: {
      columns: ['job', input.unit, 'moving range', 'pattern'],
      rows: input.points.map((p, i) => [nameOf(p, i), figure(p.value), p.movingRange === null ? '–' : p.movingRange.toFixed(2), [...p.hits, ...(p.rangeBeyondLimit ? [RANGE_WORDS] : [])].join('; ') || '–']),
    },
  };
}

const figure = (value: number, unit = '') => `${value < 0 ? '−' : value > 0 ? '+' : ''}${Math.abs(value).toFixed(2)}${unit === '' ? '' : ` ${unit}`}`;
const nameOf = (point: OvenChartPoint, index: number) => point.label ?? `job ${index + 1}`;

/** What the chart says, once for each pattern: where it was first seen. */
function spoken(input: OvenChartInput): string[] {
  const first = new Map<string, number>();
  input.points.forEach((point, i) => {
    for (const words of [...point.hits, ...(point.rangeBeyondLimit ? [RANGE_WORDS] : [])]) if (!first.has(words)) first.set(words, i);
  });
  if (first.size === 0) return ['No pattern: the oven keeps as it was.'];
  return [...first].map(([words, i]) => `${nameOf(input.points[i]!, i)}, ${figure(input.points[i]!.value, input.unit)}: ${words}.`);
}

const beyondEdge = (value: number, plot: Plot) => (plot.y(value) < plot.top - 0.5 ? -1 : plot.y(value) > plot.bottom + 0.5 ? 1 : 0);

/** Figures of the points that stand at the edge, the first of them if there are many. */
function offScale({ points, unit }: OvenChartInput, plot: Plot): string[] {
  const all = points.flatMap((p, i) => (beyondEdge(p.value, plot) === 0 ? [] : [`${nameOf(p, i)} ${figure(p.value, unit)}`]));
  if (all.length === 0) return [];
  return [`Triangles, beyond the scale: ${all.slice(0, MOST_NAMED).join(', ')}${all.length > MOST_NAMED ? ` and ${all.length - MOST_NAMED} more` : ''}.`];
}

function frame(input: OvenChartInput, upper: Plot, lower: Plot): Shape[] {
  const shapes: Shape[] = [label(0, 12, `change of core loss, ${input.unit}`), label(0, lower.top - 10, 'step from job to job')];
  const line = (plot: Plot, value: number, words: string, limit: boolean) => {
    const y = plot.y(value);
    shapes.push(across(plot, y, limit ? 'fails' : 'line', limit ? 1.6 : 1.2, limit ? [6, 4] : undefined), label(plot.right + 5, y + 4, words, 'start', limit ? 'fails' : 'muted'));
  };
  line(upper, input.upperLimit, figure(input.upperLimit), true);
  line(upper, input.centre, figure(input.centre), false);
  line(upper, input.lowerLimit, figure(input.lowerLimit), true);
  line(lower, input.movingRangeLimit, input.movingRangeLimit.toFixed(2), true);
  line(lower, input.meanMovingRange, input.meanMovingRange.toFixed(2), false);
  shapes.push(across(lower, lower.bottom, 'hair', 1));
  if (input.baseLast < input.points.length) {
    const x = upper.x(input.baseLast + 0.5);
    shapes.push({ kind: 'path', d: `${moveTo({ x, y: upper.top })}${lineTo({ x, y: lower.bottom })}`, stroke: 'line', strokeWidth: 1, dash: [2, 3] });
    const half = 'limits from these | since then'.length * 2.95;
    shapes.push(label(Math.max(half, Math.min(x, upper.right + 46 - half)), lower.bottom + 16, 'limits from these | since then', 'middle'));
  } else shapes.push(label((upper.left + upper.right) / 2, lower.bottom + 16, 'limits from all of these', 'middle'));
  return shapes;
}

const clamp = (value: number, from: number, to: number) => Math.min(to, Math.max(from, value));

function individuals({ points }: OvenChartInput, plot: Plot): Shape[] {
  const at = points.map((p, i): Point => ({ x: plot.x(i + 1), y: clamp(plot.y(p.value), plot.top, plot.bottom) }));
  const marks = points.map((p, i): Shape => {
    const here = at[i]!;
    const mark = `job-${i + 1}`;
    const off = beyondEdge(p.value, plot);
    if (off !== 0) return edgeMark(here, off, mark);
    return p.hits.length > 0 ? diamond(here, mark) : ({ kind: 'circle', cx: here.x, cy: here.y, r: 2.6, fill: 'steel', mark } satisfies Shape);
  });
  return [{ kind: 'path', d: polyline(at), stroke: 'steel', strokeWidth: 1.2 }, ...marks];
}

function ranges({ points }: OvenChartInput, plot: Plot): Shape[] {
  const at = points.flatMap((p, i) => (p.movingRange === null ? [] : [{ x: plot.x(i + 1), y: clamp(plot.y(p.movingRange), plot.top, plot.bottom), beyond: p.rangeBeyondLimit, mark: `job-${i + 1}` }]));
  const marks = at.map((p): Shape =>
    p.beyond ? { kind: 'rect', x: p.x - 4, y: p.y - 4, width: 8, height: 8, fill: 'card', stroke: 'fails', strokeWidth: 1.8, mark: p.mark } : { kind: 'circle', cx: p.x, cy: p.y, r: 2, fill: 'steel', mark: p.mark },
  );
  return at.length === 0 ? [] : [{ kind: 'path', d: polyline(at), stroke: 'steel', strokeWidth: 1 }, ...marks];
}

const diamond = ({ x, y }: Point, mark: string): Shape => ({ kind: 'path', d: `${polyline([{ x, y: y - 6 }, { x: x + 6, y }, { x, y: y + 6 }, { x: x - 6, y }])}Z`, fill: 'card', stroke: 'fails', strokeWidth: 1.8, mark });

/** Off the scale: a triangle that points to where the figure would be. */
const edgeMark = ({ x, y }: Point, down: number, mark: string): Shape => ({
  kind: 'path',
  d: `${polyline([{ x, y: y + 5 * down }, { x: x + 6, y: y - 5 * down }, { x: x - 6, y: y - 5 * down }])}Z`,
  fill: 'fails',
  mark,
});
