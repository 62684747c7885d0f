import type { Ink, Shape } from './drawing.js';
import { digits, lineTo, moveTo, type Point } from './pen.js';

/** A field with a scale to each side; y grows downwards on the drawing, upwards in the figures. */
export interface Plot {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  x(value: number): number;
  y(value: number): number;
}
export interface Span {
  readonly from: number;
  readonly to: number;
}

export function plotOf(box: { left: number; right: number; top: number; bottom: number }, across: Span, up: Span): Plot {
  const share = (value: number, { from, to }: Span) => (to === from ? 0.5 : (value - from) / (to - from));
  return { ...box, x: (value) => box.left + share(value, across) * (box.right - box.left), y: (value) => box.bottom - share(value, up) * (box.bottom - box.top) };
}

/** Round figures for a scale: steps of 1, 2 or 5 and their tens, `most` of them at most. */
export function roundTicks({ from, to }: Span, most: number): number[] {
  if (!(to > from)) return [from];
  const rough = (to - from) / most;
  const ten = 10 ** Math.floor(Math.log10(rough));
  const step = [1, 2, 5, 10].map((n) => n * ten).find((s) => s >= rough * (1 - 1e-9)) ?? 10 * ten;
  const first = Math.ceil(from / step - 1e-9);
  return Array.from({ length: Math.floor(to / step + 1e-9) - first + 1 }, (_, i) => Number(((first + i) * step).toPrecision(12)));
}

/** Words broken into lines of so many letters at most; a longer word stands alone. */
export function brokenWords(words: string, letters: number): string[] {
  const lines: string[] = [];
  for (const word of words.split(' ')) {
    const last = lines.at(-1);
    if (last !== undefined && `${last} ${word}`.length <= letters) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines;
}

export const label = (x: number, y: number, text: string, anchor: 'start' | 'middle' | 'end' = 'start', ink: Ink = 'muted', size = 11): Shape => ({ kind: 'text', x, y, text, size, weight: 400, anchor, ink });
export const across = (plot: Plot, y: number, stroke: Ink, strokeWidth: number, dash?: readonly number[]): Shape => ({
  kind: 'path',
  d: `M${digits(plot.left)} ${digits(y)}L${digits(plot.right)} ${digits(y)}`,
  stroke,
  strokeWidth,
  ...(dash ? { dash } : {}),
});
export const polyline = (points: readonly Point[]): string => points.map((p, i) => (i === 0 ? moveTo(p) : lineTo(p))).join('');
