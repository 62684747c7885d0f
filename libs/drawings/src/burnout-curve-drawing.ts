import type { Drawing, Shape } from './drawing.js';
import { digits } from './pen.js';
import { across, brokenWords, label, plotOf, polyline, roundTicks, type Plot, type Span } from './plot-frame.js';

export interface BurnoutCurvePoint {
  readonly minute: number;
  readonly celsius: number;
}
export interface BurnoutChannel {
  readonly name: string;
  readonly peakC: number;
  /** in order of time */
  readonly points: readonly BurnoutCurvePoint[];
  /** stretches without readings: the curve is broken there */
  readonly gaps: readonly { readonly fromMinute: number; readonly toMinute: number }[];
  /** above the limit that is drawn; null where there is none */
  readonly aboveLimit: { readonly minutes: number; readonly unknownMinutes: number } | null;
}
export interface BurnoutCurveInput {
  readonly channels: readonly BurnoutChannel[];
  /** with its words, such as 'limit 370 °C, core plate unknown' */
  readonly limit: { readonly celsius: number; readonly words: string } | null;
  readonly title?: string;
  /** temperatures come in °C and are drawn in °F */
  readonly fahrenheit?: boolean;
  /** for a phone: 340 units wide */
  readonly narrow?: boolean;
}

const [TOP, HEIGHT, LINE] = [22, 190, 15];

/**
 * The temperature record of a burnout: the hottest channel strong, the others thin behind it, the limit as a line, and the time
 * above it hatched. Gaps stay open.
 *
 * @returns a drawing 560 units wide, 340 where `narrow`; without readings a drawing that says so.
 * @throws {RangeError} when a figure is no number.
 *
 * Source: own drawing.
 */
export function burnoutCurveDrawing(asked: BurnoutCurveInput): Drawing {
  const input = asked.fahrenheit ? inFahrenheit(asked) : asked;
  const width = input.narrow ? 340 : 560;
  const title = input.title ?? 'Burnout, temperature of the part';
  const channels = input.channels.filter((c) => c.points.length > 0);
  const hottest = channels.reduce<BurnoutChannel | undefined>((best, c) => (best === undefined || c.peakC > best.peakC ? c : best), undefined);
  if (!hottest) {
    const words = 'No temperature record of this burnout.';
    return { width, height: 60, title, description: words, shapes: [label(0, 34, words, 'start', 'muted', 13)] };
  }
  const minutes = span(channels.flatMap((c) => c.points.map((p) => p.minute)));
  const celsius = span([0, input.limit?.celsius ?? 0, ...channels.flatMap((c) => c.points.map((p) => p.celsius))]);
  const plot = plotOf({ left: 34, right: width - 8, top: TOP, bottom: TOP + HEIGHT }, minutes, { from: celsius.from, to: celsius.from + (celsius.to - celsius.from) * 1.08 });
  const words = spoken(input, hottest, channels);
  const lines = words.flatMap((text) => brokenWords(text, Math.floor(width / 6.6)));
  const wordsFrom = plot.bottom + 42;
  return {
    width,
    height: wordsFrom + lines.length * LINE,
    title,
    description: words.join(' '),
    shapes: [
      ...scales(plot, minutes, celsius, unitOf(input)),
      ...hatched(input, hottest, plot),
      ...channels.filter((c) => c !== hottest).map((c) => curve(c, plot, false)),
      curve(hottest, plot, true),
      ...limitLine(input, plot),
      ...peak(hottest, plot, unitOf(input)),
      ...lines.map((text, i) => label(0, wordsFrom + i * LINE, text, 'start', 'text', 12)),
    ],
    table: {
      columns: ['channel', `peak, ${unitOf(input)}`, 'min above the limit', 'min not known'],
      rows: channels.map((c) => [c.name, c.peakC.toFixed(1), c.aboveLimit ? c.aboveLimit.minutes.toFixed(0) : '–', c.aboveLimit ? c.aboveLimit.unknownMinutes.toFixed(0) : '–']),
    },
  };
}

const unitOf = ({ fahrenheit }: BurnoutCurveInput) => (fahrenheit ? '°F' : '°C');
const fahrenheit = (celsius: number) => celsius * 1.8 + 32;

/** The same record on the other scale; what is called Celsius below is then Fahrenheit. */
const inFahrenheit = (input: BurnoutCurveInput): BurnoutCurveInput => ({
  ...input,
  limit: input.limit && { ...input.limit, celsius: fahrenheit(input.limit.celsius) },
  channels: input.channels.map((c) => ({ ...c, peakC: fahrenheit(c.peakC), points: c.points.map((p) => ({ ...p, celsius: fahrenheit(p.celsius) })) })),
});

function span(values: readonly number[]): Span {
  let [from, to] = [Infinity, -Infinity];
  for (const value of values) {
    // digits refuses what is no number, before a scale is made of it
    digits(value);
    from = Math.min(from, value);
    to = Math.max(to, value);
  }
  return { from, to };
}

function spoken(input: BurnoutCurveInput, hottest: BurnoutChannel, channels: readonly BurnoutChannel[]): string[] {
  const { limit } = input;
  const unit = unitOf(input);
  const which = channels.length > 1 ? `${hottest.name}, the hottest of ${channels.length}` : hottest.name;
  if (!limit) return [`${which}: peak ${hottest.peakC.toFixed(0)} ${unit}. No limit is set.`];
  const words = [`${which}: peak ${hottest.peakC.toFixed(0)} ${unit}; ${limit.words}.`];
  const { aboveLimit } = hottest;
  if (aboveLimit && aboveLimit.minutes > 0) words.push(`${atLeastOne(aboveLimit.minutes)} min above the limit, hatched.`);
  else if (hottest.peakC <= limit.celsius) words.push('Never above the limit while it was read.');
  if (aboveLimit && aboveLimit.unknownMinutes > 0) words.push(`${atLeastOne(aboveLimit.unknownMinutes)} min beside it were not read: what it did there is not known.`);
  return words;
}
const atLeastOne = (minutes: number) => (minutes < 1 ? 'under 1' : minutes.toFixed(0));

function scales(plot: Plot, minutes: Span, celsius: Span, degrees: string): Shape[] {
  // a short record is read in minutes
  const [unit, perUnit] = minutes.to - minutes.from < 120 ? ['min', 1] : ['h', 60];
  const most = plot.right > 400 ? 8 : 5;
  return [
    label(0, 11, degrees),
    ...roundTicks(celsius, 5).flatMap((t) => [across(plot, plot.y(t), 'hair', 0.8), label(plot.left - 5, plot.y(t) + 4, String(t).replace('-', '−'), 'end')]),
    across(plot, plot.bottom, 'line', 1),
    ...roundTicks({ from: minutes.from / perUnit, to: minutes.to / perUnit }, most).map((tick) => {
      const words = `${tick} ${unit}`;
      const half = words.length * 3;
      return label(Math.max(half, Math.min(plot.x(tick * perUnit), plot.right + 8 - half)), plot.bottom + 16, words, 'middle');
    }),
  ];
}

const inGap = (channel: BurnoutChannel, a: BurnoutCurvePoint, b: BurnoutCurvePoint) => channel.gaps.some((g) => a.minute <= g.fromMinute + 1e-9 && b.minute >= g.toMinute - 1e-9 && b.minute > a.minute);

/** The curve in pieces, broken where nothing was read. */
function pieces(channel: BurnoutChannel): BurnoutCurvePoint[][] {
  const all: BurnoutCurvePoint[][] = [[]];
  channel.points.forEach((p, i) => {
    const last = channel.points[i - 1];
    if (last && inGap(channel, last, p)) all.push([]);
    all.at(-1)!.push(p);
  });
  return all;
}

const curve = (channel: BurnoutChannel, plot: Plot, strong: boolean): Shape => ({
  kind: 'path',
  d: pieces(channel).map((piece) => polyline((piece.length === 1 ? [piece[0]!, piece[0]!] : piece).map((p) => ({ x: plot.x(p.minute), y: plot.y(p.celsius) })))).join(''),
  stroke: strong ? 'copper' : 'steel',
  strokeWidth: strong ? 2.2 : 1,
  cap: 'round',
});

/** When the hottest channel was above the limit; stretches closer than the eye can part are drawn as one. */
function stretchesAbove(channel: BurnoutChannel, limitC: number, plot: Plot): Span[] {
  const found: { from: number; to: number }[] = [];
  for (const piece of pieces(channel)) {
    piece.slice(1).forEach((b, i) => {
      const a = piece[i]!;
      if (Math.max(a.celsius, b.celsius) <= limitC) return;
      const crossing = plot.x(a.minute + ((limitC - a.celsius) / (b.celsius - a.celsius)) * (b.minute - a.minute));
      const from = a.celsius < limitC ? crossing : plot.x(a.minute);
      const to = b.celsius < limitC ? crossing : plot.x(b.minute);
      const last = found.at(-1);
      if (last && from - last.to < 1) last.to = to;
      else found.push({ from, to });
    });
  }
  return found;
}

function hatched({ limit }: BurnoutCurveInput, hottest: BurnoutChannel, plot: Plot): Shape[] {
  if (!limit) return [];
  const top = plot.y(Math.max(hottest.peakC, limit.celsius));
  return stretchesAbove(hottest, limit.celsius, plot).map(({ from, to }) => ({ kind: 'hatch', x: from, y: top, width: Math.max(1, to - from), height: plot.y(limit.celsius) - top, ink: 'fails' }));
}

function limitLine(input: BurnoutCurveInput, plot: Plot): Shape[] {
  const { limit } = input;
  if (!limit) return [];
  const y = plot.y(limit.celsius);
  return [across(plot, y, 'fails', 2), label(plot.left + 4, y + 14, `${Number(limit.celsius.toFixed(1))} ${unitOf(input)}`, 'start', 'fails', 11.5)];
}

function peak(hottest: BurnoutChannel, plot: Plot, unit: string): Shape[] {
  const at = hottest.points.reduce((best, p) => (p.celsius > best.celsius ? p : best));
  const [x, y] = [plot.x(at.minute), plot.y(at.celsius)];
  const words = `${hottest.peakC.toFixed(0)} ${unit}`;
  const half = words.length * 3.6;
  return [
    { kind: 'circle', cx: x, cy: y, r: 3.6, fill: 'card', stroke: 'copper', strokeWidth: 2 },
    { kind: 'text', x: Math.max(plot.left + half, Math.min(x, plot.right - half)), y: Math.max(11, y - 8), text: words, size: 12, weight: 600, anchor: 'middle', ink: 'text' },
  ];
}
