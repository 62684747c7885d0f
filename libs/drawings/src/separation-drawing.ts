import { lossPartsAt, type Separation, type SeparationFigures } from '@libs/core-loss';
import { toShown, type UnitSystem } from '@libs/quantities';
import type { Drawing, Ink, Shape } from './drawing.js';
import { digits } from './pen.js';
import { across, brokenWords, label, plotOf, roundTicks, type Plot } from './plot-frame.js';

export interface SeparationDrawingInput {
  readonly before: Separation | null;
  readonly after: Separation | null;
  /** the sentence that says which part grew, where both are there */
  readonly answer?: string;
  readonly units?: UnitSystem;
  readonly title?: string;
  /** for a phone: 340 units wide */
  readonly narrow?: boolean;
}

interface Line {
  readonly name: 'before' | 'after';
  readonly ink: Ink;
  readonly figures: SeparationFigures;
  /** false: the figures are there and do not tell */
  readonly tells: boolean;
  readonly why: readonly string[];
}

const LINE_HEIGHT = 15;
/** A blank that no line is broken at: a figure keeps its uncertainty and its unit. */
const KEPT = '\u00a0';

/**
 * Loss per cycle against frequency, before and after: where a line meets no frequency is hysteresis, its slope is eddy loss.
 *
 * @returns a drawing 560 units wide, 340 where `narrow`; null while no test has two frequencies: then there is nothing to split, and the plot stays hidden.
 * @throws {RangeError} when a figure is no number.
 *
 * Source: own drawing.
 */
export function separationDrawing(input: SeparationDrawingInput): Drawing | null {
  const lines = [...lineOf('before', 'muted', input.before), ...lineOf('after', 'steel', input.after)];
  if (lines.length === 0) return null;
  const units = input.units ?? 'si';
  const unit = units === 'si' ? 'mJ/kg' : 'mJ/lb';
  // W/kg over Hz is J/kg: it converts as a loss does
  const shown = (joulesPerKg: number) => toShown(joulesPerKg, 'specific-loss', units) * 1000;
  const width = input.narrow ? 340 : 560;
  const heights = lines.flatMap(({ figures: f }) => [shown(f.hysteresisPerCycle), ...f.points.map((p) => shown(p.joulesPerKg + f.coverageFactor * p.standardUncertainty))]);
  const frequencies = [...new Set([0, ...lines.flatMap(({ figures }) => figures.points.map((p) => p.frequencyHz))])].sort((a, b) => a - b);
  const plot = plotOf({ left: 40, right: width - 8, top: 26, bottom: 210 }, { from: 0, to: (frequencies.at(-1) ?? 50) * 1.08 }, { from: Math.min(0, ...heights), to: Math.max(...heights) * 1.12 });
  const spoken = [...lines.map((l) => words(l, units)), ...lines.flatMap((l) => l.why), ...(input.answer === undefined ? [] : [input.answer])];
  const broken = spoken.flatMap((text) => brokenWords(text, Math.floor(width / 6.6)));
  const from = plot.bottom + 46;
  return {
    width,
    height: from + broken.length * LINE_HEIGHT,
    title: input.title ?? 'Loss per cycle against frequency',
    description: spoken.join(' ').replaceAll(KEPT, ' '),
    shapes: [
      ...frame(plot, unit, frequencies, Math.max(...heights) * 1.12),
      ...lines.flatMap((line) => drawn(line, plot, shown)),
      ...broken.map((text, i) => label(0, from + i * LINE_HEIGHT, text, 'start', 'text', 12)),
    ],
    table: {
      columns: ['test', 'Hz', `${unit} a cycle`, '± (expanded)'],
      rows: lines.flatMap(({ name, figures }) => figures.points.map((p) => [name, String(p.frequencyHz), shown(p.joulesPerKg).toFixed(2), shown(figures.coverageFactor * p.standardUncertainty).toFixed(2)])),
    },
  };
}

function lineOf(name: Line['name'], ink: Ink, separation: Separation | null): Line[] {
  if (separation === null || !('points' in separation)) return [];
  const tells = separation.outcome === 'separated';
  return [{ name, ink, figures: separation, tells, why: separation.outcome === 'separated' ? [] : separation.reasons.map((r) => `${name}: ${r.words}`) }];
}

/** Both parts in the words of a reading, at the higher of the two frequencies. */
function words({ name, figures: f, tells }: Line, units: UnitSystem): string {
  const hertz = Math.max(...f.points.map((p) => p.frequencyHz));
  const parts = lossPartsAt(f, hertz);
  const per = units === 'si' ? 'W/kg' : 'W/lb';
  const figure = (value: number, u: number) => `${toShown(value, 'specific-loss', units).toFixed(2)} ± ${toShown(f.coverageFactor * u, 'specific-loss', units).toFixed(2)} ${per}`.replaceAll(' ', KEPT);
  if (!tells) return `${name}: the parts cannot be told at ${hertz} Hz.`;
  return `${name}: hysteresis ${figure(parts.hysteresis, f.uHysteresisPerCycle * hertz)}, eddy ${figure(parts.eddy, f.uEddyPerCycleHz * hertz ** 2)} at ${hertz} Hz.`;
}

function frame(plot: Plot, unit: string, frequencies: readonly number[], highest: number): Shape[] {
  const rows = roundTicks({ from: 0, to: highest }, 5);
  // the readings' own frequencies are the scale; of two that would write over each other the higher one stands
  const columns = frequencies.filter((f, i) => i === frequencies.length - 1 || plot.x(frequencies[i + 1] ?? f) - plot.x(f) > 26);
  return [
    ...rows.flatMap((value) => [across(plot, plot.y(value), 'hair', 1), label(plot.left - 6, plot.y(value) + 4, String(value), 'end')]),
    ...columns.map((value) => label(plot.x(value), plot.bottom + 15, String(value), 'middle')),
    { kind: 'path', d: `M${digits(plot.left)} ${digits(plot.top)}L${digits(plot.left)} ${digits(plot.bottom)}`, stroke: 'line', strokeWidth: 1.2 },
    label(0, 12, `${unit} a cycle`),
    label(plot.right, plot.bottom + 29, 'Hz', 'end'),
  ];
}

/** The line is whole between the readings and dashed down to no frequency; readings stand on it with their uncertainty. */
function drawn(line: Line, plot: Plot, shown: (joulesPerKg: number) => number): Shape[] {
  const { figures: f, ink, name, tells } = line;
  const [low, high] = f.points;
  if (!low || !high) return [];
  const at = (hertz: number, joulesPerKg: number) => `${digits(plot.x(hertz))} ${digits(plot.y(shown(joulesPerKg)))}`;
  const before = name === 'before';
  const marks = f.points.flatMap((p): Shape[] => {
    const [x, y] = [plot.x(p.frequencyHz), plot.y(shown(p.joulesPerKg))];
    const reach = f.coverageFactor * p.standardUncertainty;
    return [
      { kind: 'path', d: `M${at(p.frequencyHz, p.joulesPerKg - reach)}L${at(p.frequencyHz, p.joulesPerKg + reach)}`, stroke: ink, strokeWidth: 1.8 },
      // before is a ring, after a square: told apart without their colour
      before ? { kind: 'circle', cx: x, cy: y, r: 4, fill: 'card', stroke: ink, strokeWidth: 2, mark: `${name}-${p.frequencyHz}` } : { kind: 'rect', x: x - 4, y: y - 4, width: 8, height: 8, fill: ink, mark: `${name}-${p.frequencyHz}` },
    ];
  });
  return [
    { kind: 'path', d: `M${at(0, f.hysteresisPerCycle)}L${at(low.frequencyHz, low.joulesPerKg)}`, stroke: ink, strokeWidth: 1.6, dash: [5, 5], mark: `${name}-hysteresis` },
    { kind: 'path', d: `M${at(low.frequencyHz, low.joulesPerKg)}L${at(high.frequencyHz, high.joulesPerKg)}`, stroke: ink, strokeWidth: 2.2, ...(tells ? {} : { dash: [2, 4] }), mark: `${name}-eddy` },
    ...marks,
    label(plot.x(high.frequencyHz) - 8, plot.y(shown(high.joulesPerKg)) + (before ? 16 : -9), name, 'end', ink, 11),
  ];
}
