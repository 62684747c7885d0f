import type { Drawing, Shape } from './drawing.js';
import { digits } from './pen.js';

export interface StripBar {
  /** what stands before the bar: 'before', 'after', 'after repair' */
  readonly label: string;
  /** in the unit shown */
  readonly value: number;
  readonly uncertainty: number;
  /** the figure in words, such as '2.41 ± 0.12' */
  readonly words: string;
}

export interface StripDrawingInput {
  readonly before: StripBar | null;
  readonly after: readonly StripBar[];
  /** the limit on this scale, in the unit shown, with its words; null where none applies */
  readonly limit: { readonly value: number; readonly words: string } | null;
  /** '+18.6 %' and '± 2.4 points'; null where the increase is not established */
  readonly increase: { readonly figure: string; readonly interval: string } | null;
  readonly unit: string;
  readonly title?: string;
}

const WIDTH = 560;
const LEFT = 84;
const RIGHT = 396;
const ROW = 42;
const TOP = 12;

/**
 * Before and after on one horizontal scale of specific loss: each bar with its own uncertainty, the limit as a line,
 * the zone beyond it hatched, and the increase with its own, narrower interval below.
 *
 * @returns a drawing 560 units wide; with neither test a drawing that says what to do.
 * @throws {RangeError} when a bar's value or uncertainty is no number.
 *
 * Source: own drawing.
 */
export function stripDrawing(input: StripDrawingInput): Drawing {
  const bars = [...(input.before ? [input.before] : []), ...input.after];
  const title = input.title ?? 'Core loss before and after';
  if (bars.length === 0) return emptyStrip(title);
  const rows = bars.length;
  const height = TOP + rows * ROW + 46;
  const top = Math.max(...bars.map((b) => b.value + b.uncertainty), input.limit ? input.limit.value * 1.12 : 0) * 1.06;
  const scale = (value: number) => LEFT + (Math.max(0, value) / (top || 1)) * (RIGHT - LEFT);
  // the line stands over the bars, so that a bar which passes the limit is seen to pass it
  const shapes: Shape[] = [...beyondLimit(input, scale, rows)];
  bars.forEach((bar, i) => shapes.push(...barShapes(bar, TOP + i * ROW + ROW / 2, scale, bar === input.before, input.unit)));
  shapes.push(...limitLine(input, scale, rows));
  bars.forEach((bar, i) => shapes.push(whisker(bar, TOP + i * ROW + ROW / 2, scale)));
  shapes.push(...increaseWords(input, height));
  return {
    width: WIDTH,
    height,
    title,
    description: describe(input, bars),
    shapes,
    table: { columns: ['test', input.unit, '± (k = 2)'], rows: bars.map((b) => [b.label, b.value.toFixed(3), b.uncertainty.toFixed(3)]) },
  };
}

function emptyStrip(title: string): Drawing {
  return {
    width: WIDTH,
    height: 76,
    title,
    description: 'No core test yet.',
    shapes: [
      { kind: 'path', d: `M${LEFT} 38L${RIGHT} 38`, stroke: 'line', strokeWidth: 1.2, dash: [5, 5] },
      { kind: 'text', x: LEFT, y: 26, text: 'No core test yet.', size: 13, weight: 400, anchor: 'start', ink: 'muted' },
    ],
  };
}

function barShapes(bar: StripBar, y: number, scale: (v: number) => number, isBefore: boolean, unit: string): Shape[] {
  const [x0, x1] = [scale(0), scale(bar.value)];
  return [
    { kind: 'text', x: 0, y: y + 4.5, text: bar.label, size: 12.5, weight: 400, anchor: 'start', ink: 'text' },
    { kind: 'rect', x: x0, y: y - 8, width: Math.max(0, x1 - x0), height: 16, fill: isBefore ? 'line' : 'steel' },
    { kind: 'text', x: WIDTH - 150, y: y + 5, text: bar.words, size: 14, weight: 600, anchor: 'start', ink: 'text' },
    { kind: 'text', x: WIDTH, y: y + 5, text: unit, size: 12, weight: 400, anchor: 'end', ink: 'muted' },
  ];
}

/** The bar's own uncertainty, from low to high with a mark at each end. */
function whisker(bar: StripBar, y: number, scale: (v: number) => number): Shape {
  const [low, high] = [scale(bar.value - bar.uncertainty), scale(bar.value + bar.uncertainty)].map(digits);
  const [over, under] = [digits(y - 10), digits(y + 10)];
  return { kind: 'path', d: `M${low} ${digits(y)}L${high} ${digits(y)}M${low} ${over}L${low} ${under}M${high} ${over}L${high} ${under}`, stroke: 'text', strokeWidth: 1.8 };
}

function beyondLimit({ limit }: StripDrawingInput, scale: (v: number) => number, rows: number): Shape[] {
  if (!limit) return [];
  const x = scale(limit.value);
  return [{ kind: 'hatch', x, y: TOP - 4, width: Math.max(0, RIGHT + 6 - x), height: rows * ROW + 4, ink: 'fails' }];
}

function limitLine({ limit }: StripDrawingInput, scale: (v: number) => number, rows: number): Shape[] {
  if (!limit) return [];
  const x = scale(limit.value);
  const bottom = TOP + rows * ROW;
  return [
    { kind: 'path', d: `M${digits(x)} ${digits(TOP - 8)}L${digits(x)} ${digits(bottom + 4)}`, stroke: 'fails', strokeWidth: 2.4 },
    { kind: 'text', x: Math.min(x, RIGHT - 60), y: bottom + 17, text: limit.words, size: 11.5, weight: 400, anchor: 'middle', ink: 'fails' },
  ];
}

function increaseWords({ increase, before }: StripDrawingInput, height: number): Shape[] {
  const y = height - 6;
  if (increase) {
    return [
      { kind: 'text', x: 0, y, text: increase.figure, size: 17, weight: 700, anchor: 'start', ink: 'text' },
      { kind: 'text', x: LEFT + 6, y, text: increase.interval, size: 12.5, weight: 400, anchor: 'start', ink: 'muted' },
    ];
  }
  return [{ kind: 'text', x: 0, y, text: before ? 'The test after is still to come.' : 'Increase not established: there is no test before.', size: 12.5, weight: 400, anchor: 'start', ink: 'muted' }];
}

function describe(input: StripDrawingInput, bars: readonly StripBar[]): string {
  const tests = bars.map((b) => `${b.label} ${b.words} ${input.unit}`).join('; ');
  const increase = input.increase ? ` Increase ${input.increase.figure} ${input.increase.interval}.` : '';
  return `${tests}.${input.limit ? ` ${input.limit.words}.` : ''}${increase}`;
}
