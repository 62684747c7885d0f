import { mapProblems, type HotSpot, type RiseMap, type TemperatureMap } from '@libs/core-loss';
import { formatQuantity, toShown, unitOf, type UnitSystem } from '@libs/quantities';
import type { Drawing, Shape } from './drawing.js';
import { heatPaint } from './heat-paint.js';
import { brokenWords, label, plotOf, roundTicks, type Plot, type Span } from './plot-frame.js';

export interface UnrolledBoreInput {
  readonly map: TemperatureMap;
  /** the rise of each place, as `riseMap` gives it; null is a hole */
  readonly rises: RiseMap;
  /** the rise that is drawn at full heat: the hot-spot limit at this flux */
  readonly heatFullK: number;
  readonly spots?: readonly HotSpot[];
  /** the whole length of the stack; half a step beyond the last place where it is left out */
  readonly lengthM?: number;
  /** what the rises are counted from, such as 'over the mean' */
  readonly overWords?: string;
  /** the end that lengths are measured from, such as 'drive end' */
  readonly endWords?: string;
  readonly units?: UnitSystem;
  readonly title?: string;
  /** for a phone: 340 units wide */
  readonly narrow?: boolean;
}

const [TOP, HEIGHT, LINE] = [26, 150, 15];
const MOST_SPOTS = 6;

/**
 * The bore cut open and laid flat: slots across, the length of the core down, each place in the colour of its rise. Places that were not read are
 * hatched; each hot spot is framed, one that runs over the last slot at both edges, and named in words below.
 *
 * @returns a drawing 560 units wide, 340 where `narrow`; a map with problems gives the drawing that names the first of them.
 * @throws {RangeError} when the full heat is not more than 0 or a rise is no number.
 *
 * Source: own drawing.
 */
export function unrolledBoreDrawing(input: UnrolledBoreInput): Drawing {
  const width = input.narrow ? 340 : 560;
  const title = input.title ?? 'Bore laid flat, warm places';
  const { map, rises, heatFullK } = input;
  const [problem] = mapProblems(map);
  if (problem) return { width, height: 60, title, description: problem.words, shapes: brokenWords(problem.words, Math.floor(width / 6.8)).map((text, i) => label(0, 20 + i * LINE, text, 'start', 'muted', 12)) };
  if (!(heatFullK > 0)) throw new RangeError('A drawing was asked for without the rise of full heat.');
  if (rises.flat().some((rise) => rise !== null && !Number.isFinite(rise))) throw new RangeError('A drawing was asked for with a rise that is no number.');
  const units = input.units ?? 'si';
  const bounds = axialBounds(map.axialM, input.lengthM);
  const plot = plotOf({ left: 44, right: width - 4, top: TOP, bottom: TOP + HEIGHT }, { from: 0.5, to: map.slots + 0.5 }, { from: bounds.at(-1) ?? 1, to: bounds[0] ?? 0 });
  const over = input.overWords ?? 'over the mean';
  const spoken = sentences(input, units, over);
  const lines = spoken.flatMap((text) => brokenWords(text, Math.floor(width / 6.6)));
  const from = plot.bottom + 46;
  return {
    width,
    height: from + lines.length * LINE,
    title,
    description: spoken.join(' '),
    shapes: [
      ...gaps(map, plot),
      ...map.slotNumbers.flatMap((slot, row) => map.axialM.flatMap((_x, column) => cell(plot, map, slot, column, bounds, rises[row]?.[column] ?? null, heatFullK))),
      ...(input.spots ?? []).flatMap((spot, i) => framed(plot, map, spot, bounds, i)),
      ...scales(plot, map, bounds, units, input.endWords),
      ...lines.map((text, i) => label(0, from + i * LINE, text, 'start', 'text', 12)),
    ],
    table: {
      columns: ['slot', ...map.axialM.map((x) => formatQuantity(x, 'length', units, { digits: units === 'si' ? 0 : 2 }))],
      rows: map.slotNumbers.map((slot, row) => [String(slot), ...map.axialM.map((_x, column) => { const rise = rises[row]?.[column] ?? null; return rise === null ? '–' : toShown(rise, 'temperature-difference', units).toFixed(1); })]),
    },
  };
}

/** Edges between the places along the core: half way between two of them. */
function axialBounds(axialM: readonly number[], lengthM: number | undefined): number[] {
  const [first, last] = [axialM[0] ?? 0, axialM.at(-1) ?? 0];
  const inner = axialM.slice(1).map((x, i) => (x + (axialM[i] ?? x)) / 2);
  const half = (inner[0] ?? 2 * first) - first;
  const end = last + (inner.length > 0 ? last - (inner.at(-1) ?? last) : Math.max(first, 0.01));
  return [Math.max(0, first - Math.max(half, 0)), ...inner, lengthM !== undefined && lengthM > last ? lengthM : end];
}

/** Slots from one reading to the next, the least of them: that is how wide a place is drawn. */
const stepOf = ({ slotNumbers, slots }: TemperatureMap) =>
  Math.min(...slotNumbers.map((slot, i) => (i + 1 < slotNumbers.length ? (slotNumbers[i + 1] ?? slot) - slot : (slotNumbers[0] ?? slot) + slots - slot)), slots);

/** A stretch of slots, in two pieces where it runs over the seam. */
function pieces(from: number, to: number, slots: number): Span[] {
  const [first, last] = [0.5, slots + 0.5];
  if (from < first) return [{ from: first, to }, { from: from + slots, to: last }];
  if (to > last) return [{ from, to: last }, { from: first, to: to - slots }];
  return [{ from, to }];
}

const box = (plot: Plot, across: Span, down: Span) => ({ x: plot.x(across.from), y: plot.y(down.from), width: Math.max(0, plot.x(across.to) - plot.x(across.from)), height: Math.max(0, plot.y(down.to) - plot.y(down.from)) });

function cell(plot: Plot, map: TemperatureMap, slot: number, column: number, bounds: readonly number[], rise: number | null, fullK: number): Shape[] {
  const half = Math.min(stepOf(map) / 2, map.slots / 2);
  const down = { from: bounds[column] ?? 0, to: bounds[column + 1] ?? 0 };
  const mark = `slot-${slot}-place-${column + 1}`;
  return pieces(slot - half, slot + half, map.slots).map((across): Shape => {
    if (rise === null) return { kind: 'hatch', ...box(plot, across, down), ink: 'muted', mark };
    const fill = heatPaint(rise, fullK);
    // the thin edge in its own colour closes the seam to the next place
    return { kind: 'rect', ...box(plot, across, down), fill, stroke: fill, strokeWidth: 0.6, mark };
  });
}

/** Slots between the readings that no place covers. */
function gaps(map: TemperatureMap, plot: Plot): Shape[] {
  const step = stepOf(map);
  return map.slotNumbers.flatMap((slot, i) => {
    const next = i + 1 < map.slotNumbers.length ? (map.slotNumbers[i + 1] ?? slot) : (map.slotNumbers[0] ?? slot) + map.slots;
    if (next - slot <= step) return [];
    const [from, to] = [slot + step / 2, next - step / 2];
    // wholly behind the seam it is one piece at the beginning
    const spans = from >= map.slots + 0.5 ? [{ from: from - map.slots, to: to - map.slots }] : pieces(from, to, map.slots);
    return spans.map((across): Shape => ({ kind: 'hatch', x: plot.x(across.from), y: plot.top, width: Math.max(0, plot.x(across.to) - plot.x(across.from)), height: plot.bottom - plot.top, ink: 'muted' }));
  });
}

function framed(plot: Plot, map: TemperatureMap, spot: HotSpot, bounds: readonly number[], index: number): Shape[] {
  const half = stepOf(map) / 2;
  const column = (x: number) => Math.max(0, map.axialM.findIndex((place) => Math.abs(place - x) < 1e-9));
  const down = { from: bounds[column(spot.fromAxialM)] ?? 0, to: bounds[column(spot.toAxialM) + 1] ?? 0 };
  const all = spot.slotsInWords === 'all round';
  const to = spot.toSlot < spot.fromSlot ? spot.toSlot + map.slots : spot.toSlot;
  const spans = all ? [{ from: 0.5, to: map.slots + 0.5 }] : pieces(spot.fromSlot - half, to + half, map.slots);
  const ink = spot.verdict === 'conforms' ? 'unsure' : 'fails';
  return [
    ...spans.map((across): Shape => ({ kind: 'rect', ...box(plot, across, down), stroke: ink, strokeWidth: 2, mark: `spot-${index + 1}` })),
    { kind: 'circle', cx: plot.x(spot.peakSlot), cy: (plot.y(bounds[column(spot.peakAxialM)] ?? 0) + plot.y(bounds[column(spot.peakAxialM) + 1] ?? 0)) / 2, r: 3.5, fill: 'card', stroke: ink, strokeWidth: 2, mark: `spot-${index + 1}` },
  ];
}

function scales(plot: Plot, map: TemperatureMap, bounds: readonly number[], units: UnitSystem, endWords = 'end measured from'): Shape[] {
  const [top, bottom] = [bounds[0] ?? 0, bounds.at(-1) ?? 1];
  const inUnit = (x: number) => toShown(x, 'length', units);
  const back = (shown: number) => (inUnit(1) === 0 ? 0 : shown / inUnit(1));
  const down = roundTicks({ from: inUnit(top), to: inUnit(bottom) }, 4).map((shown) => label(plot.left - 6, plot.y(back(shown)) + 4, String(shown), 'end'));
  const every = Math.max(1, Math.ceil(map.slots / 8));
  const along = Array.from({ length: Math.ceil(map.slots / every) }, (_, i) => 1 + i * every).map((slot) => label(plot.x(slot), plot.bottom + 15, String(slot), 'middle'));
  return [
    { kind: 'rect', x: plot.left, y: plot.top, width: plot.right - plot.left, height: plot.bottom - plot.top, stroke: 'line', strokeWidth: 1.2 },
    ...down,
    ...along,
    label(0, 14, `${unitOf('length', units)}, from the top: ${endWords}`),
    label(plot.right, plot.bottom + 30, 'slot', 'end'),
  ];
}

function sentences({ map, rises, spots = [] }: UnrolledBoreInput, units: UnitSystem, over: string): string[] {
  const kelvin = (k: number) => `${toShown(k, 'temperature-difference', units).toFixed(1)} ${unitOf('temperature-difference', units)}`;
  const length = (m: number) => formatQuantity(m, 'length', units, { digits: units === 'si' ? 0 : 2 });
  const known = rises.flat().filter((r): r is number => r !== null);
  const missing = map.slotNumbers.length * map.axialM.length - known.length;
  const named = spots.slice(0, MOST_SPOTS).map((s) => {
    const where = s.fromAxialM === s.toAxialM ? `at ${length(s.fromAxialM)}` : `${length(s.fromAxialM)} to ${length(s.toAxialM)}`;
    return `${s.slotsInWords === 'all round' ? 'All round' : `Slots ${s.slotsInWords}`}, ${where}: ${kelvin(s.peakK)} ${over}, hottest at slot ${s.peakSlot}.`;
  });
  return [
    ...(spots.length === 0 ? [known.length === 0 ? 'No place was read.' : `No hot spot. The warmest place is ${kelvin(Math.max(...known))} ${over}.`] : named),
    ...(spots.length > MOST_SPOTS ? [`${spots.length - MOST_SPOTS} more spots.`] : []),
    ...(missing > 0 ? [`${missing} places were not read (hatched).`] : []),
  ];
}
