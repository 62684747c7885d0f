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
  /** for a phone: 340 units wide, with the words over the bars instead of beside them */
  readonly narrow?: boolean;
}

/** Where things stand: `wide` has its words beside the bars, `narrow` over them. */
interface Layout {
  readonly width: number;
  readonly left: number;
  readonly right: number;
  readonly row: number;
  /** from the top of a row down to the middle of its bar */
  readonly bar: number;
  /** from the middle of the bar to the base line of its words */
  readonly words: number;
  readonly wordsAnchor: 'start' | 'end';
  readonly wordsX: number;
}
const WIDE: Layout = { width: 560, left: 84, right: 396, row: 42, bar: 21, words: 5, wordsAnchor: 'start', wordsX: 410 };
const NARROW: Layout = { width: 340, left: 1, right: 330, row: 58, bar: 38, words: -19, wordsAnchor: 'end', wordsX: 296 };
const TOP = 12;

/**
 * Before and after on one horizontal scale of specific loss: each bar with its own uncertainty, the limit as a line,
 * the zone beyond it hatched, and the increase with its own, narrower interval below.
 *
 * @returns a drawing 560 units wide, 340 where `narrow`; with neither test a drawing that says so.
 * @throws {RangeError} when a bar's value or uncertainty is no number.
 *
 * Source: own drawing.
 */
export function stripDrawing(input: StripDrawingInput): Drawing {
  const at = input.narrow ? NARROW : WIDE;
  const bars = [...(input.before ? [input.before] : []), ...input.after];
  const title = input.title ?? 'Core loss before and after';
  if (bars.length === 0) return emptyStrip(title, at);
  const height = TOP + bars.length * at.row + 46;
  const top = Math.max(...bars.map((b) => b.value + b.uncertainty), input.limit ? input.limit.value * 1.12 : 0) * 1.06;
  const scale = (value: number) => at.left + (Math.max(0, value) / (top || 1)) * (at.right - at.left);
  const middle = (row: number) => TOP + row * at.row + at.bar;
  return {
    width: at.width,
    height,
    title,
    description: describe(input, bars),
    // the line stands over the bars, so that a bar which passes the limit is seen to pass it
    shapes: [
      ...beyondLimit(input, at, scale, bars.length),
      ...bars.flatMap((bar, i) => barShapes(bar, middle(i), at, scale, bar === input.before, input.unit)),
      ...limitLine(input, at, scale, bars.length),
      ...bars.map((bar, i) => whisker(bar, middle(i), scale)),
      ...increaseWords(input, at, height),
    ],
    table: { columns: ['test', input.unit, '± (k = 2)'], rows: bars.map((b) => [b.label, b.value.toFixed(3), b.uncertainty.toFixed(3)]) },
  };
}

function emptyStrip(title: string, at: Layout): Drawing {
  return {
    width: at.width,
    height: 76,
    title,
    description: 'No core test yet.',
    shapes: [
      { kind: 'path', d: `M${at.left} 38L${at.right} 38`, stroke: 'line', strokeWidth: 1.2, dash: [5, 5] },
      { kind: 'text', x: at.left, y: 26, text: 'No core test yet.', size: 13, weight: 400, anchor: 'start', ink: 'muted' },
    ],
  };
}

function barShapes(bar: StripBar, y: number, at: Layout, scale: (v: number) => number, isBefore: boolean, unit: string): Shape[] {
  const base = y + at.words;
  return [
    { kind: 'text', x: 0, y: base, text: bar.label, size: 12.5, weight: 400, anchor: 'start', ink: 'text' },
    { kind: 'rect', x: scale(0), y: y - 8, width: Math.max(0, scale(bar.value) - scale(0)), height: 16, fill: isBefore ? 'line' : 'steel' },
    { kind: 'text', x: at.wordsX, y: base, text: bar.words, size: 14, weight: 600, anchor: at.wordsAnchor, ink: 'text' },
    { kind: 'text', x: at.width, y: base, text: unit, size: 12, weight: 400, anchor: 'end', ink: 'muted' },
  ];
}

/** The bar's own uncertainty, from low to high with a mark at each end. */
function whisker(bar: StripBar, y: number, scale: (v: number) => number): Shape {
  const [low, high] = [scale(bar.value - bar.uncertainty), scale(bar.value + bar.uncertainty)].map(digits);
  const [over, under] = [digits(y - 10), digits(y + 10)];
  return { kind: 'path', d: `M${low} ${digits(y)}L${high} ${digits(y)}M${low} ${over}L${low} ${under}M${high} ${over}L${high} ${under}`, stroke: 'text', strokeWidth: 1.8 };
}

function beyondLimit({ limit }: StripDrawingInput, at: Layout, scale: (v: number) => number, rows: number): Shape[] {
  if (!limit) return [];
  const x = scale(limit.value);
  const end = Math.min(at.right + 6, at.width);
  // between the words of a narrow strip the zone is broken, so that they stay readable
  const zones = at === NARROW ? Array.from({ length: rows }, (_, i) => ({ y: TOP + i * at.row + at.bar - 12, height: 24 })) : [{ y: TOP - 4, height: rows * at.row + 4 }];
  return zones.map((zone): Shape => ({ kind: 'hatch', x, width: Math.max(0, end - x), ink: 'fails', ...zone }));
}

function limitLine({ limit }: StripDrawingInput, at: Layout, scale: (v: number) => number, rows: number): Shape[] {
  if (!limit) return [];
  const x = scale(limit.value);
  const bottom = TOP + rows * at.row;
  const lines = at === NARROW ? Array.from({ length: rows }, (_, i) => [TOP + i * at.row + at.bar - 13, TOP + i * at.row + at.bar + 13] as const) : [[TOP - 8, bottom + 4] as const];
  const half = limit.words.length * 3.2;
  return [
    { kind: 'path', d: lines.map(([from, to]) => `M${digits(x)} ${digits(from)}L${digits(x)} ${digits(to)}`).join(''), stroke: 'fails', strokeWidth: 2.4 },
    { kind: 'text', x: Math.max(half, Math.min(x, at.width - half)), y: bottom + 17, text: limit.words, size: 11.5, weight: 400, anchor: 'middle', ink: 'fails' },
  ];
}

function increaseWords({ increase, before }: StripDrawingInput, at: Layout, height: number): Shape[] {
  const y = height - 6;
  if (increase) {
    return [
      { kind: 'text', x: 0, y, text: increase.figure, size: 17, weight: 700, anchor: 'start', ink: 'text' },
      { kind: 'text', x: 90, y, text: increase.interval, size: 12.5, weight: 400, anchor: 'start', ink: 'muted' },
    ];
  }
  const words = before ? 'The test after is still to come.' : 'Increase not established: there is no test before.';
  return [{ kind: 'text', x: 0, y, text: words, size: at === NARROW ? 12 : 12.5, weight: 400, anchor: 'start', ink: 'muted' }];
}

function describe(input: StripDrawingInput, bars: readonly StripBar[]): string {
  const tests = bars.map((b) => `${b.label} ${b.words} ${input.unit}`).join('; ');
  const increase = input.increase ? ` Increase ${input.increase.figure} ${input.increase.interval}.` : '';
  return `${tests}.${input.limit ? ` ${input.limit.words}.` : ''}${increase}`;
}
