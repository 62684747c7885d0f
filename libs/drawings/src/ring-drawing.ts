import { geometryProblems, type CoreGeometry } from '@libs/core-loss';
import { formatQuantity, toShown, unitOf, type UnitSystem } from '@libs/quantities';
import type { Drawing, Shape } from './drawing.js';
import { heatPaint } from './heat-paint.js';
import { arcTo, circlePath, lineTo, moveTo, polar, sectorPath, type Point } from './pen.js';

export interface RingDrawingInput {
  /** null while the size is not typed yet */
  readonly geometry: CoreGeometry | null;
  /** turns of the loop cable; 0 draws none */
  readonly turns: number;
  /** what stands in the middle: the figure as typed, its unit, and a line below */
  readonly reading?: { readonly figure: string; readonly unit: string; readonly below?: string };
  /** words beside the cable, such as '24 turns, 5.26 V each'; where more turns are planned than can be drawn, the count stands there anyway */
  readonly cableWords?: string;
  /** kelvin over the core's mean by slot, slot 1 at the top, clockwise */
  readonly heat?: ReadonlyMap<number, number>;
  /** the rise that is drawn at full heat: the hot-spot limit */
  readonly heatFullK?: number;
  readonly hottestSlot?: number;
  readonly fluxPath?: boolean;
  readonly title?: string;
  /** for the words and the table behind the drawing; SI unless told */
  readonly units?: UnitSystem;
}

const SIZE = { width: 300, height: 272 } as const;
const CENTRE: Point = { x: 150, y: 132 };
const OUTER = 112;
const SLOT_SHARE = 0.54;
const MOST_CABLES = 24;
/** The cable comes round at the lower right, clear of the flux arrow. */
const CABLE_AT = (135 * Math.PI) / 180;

interface Radii {
  readonly outer: number;
  readonly inner: number;
  readonly slotBottom: number;
  readonly slotMouth: number;
}

/** Radii on the drawing, all from one scale: the outside diameter fills the frame. */
function radii(g: CoreGeometry): Radii {
  const scale = OUTER / (g.outerDiameterM / 2);
  const inner = (g.innerDiameterM / 2) * scale;
  const slot = g.slotDepthM * scale;
  return g.kind === 'stator' ? { outer: OUTER, inner, slotMouth: inner, slotBottom: inner + slot } : { outer: OUTER, inner, slotMouth: OUTER, slotBottom: OUTER - slot };
}

/**
 * The end view of a core, drawn to scale from its own size: slots, loop cable, flux path, the reading in the middle,
 * and the temperatures laid on it by slot. A size that cannot be drawn says what is missing instead.
 *
 * @returns a drawing 300 by 272 units.
 * @throws never; a geometry with problems gives the drawing that names the first of them.
 *
 * Source: own drawing.
 */
export function ringDrawing(input: RingDrawingInput): Drawing {
  const title = input.title ?? 'End view of the core, to scale';
  const problem = input.geometry === null ? 'Type the core’s size.' : geometryProblems(input.geometry)[0]?.message;
  if (input.geometry === null || problem !== undefined) return unknownCore(title, problem ?? 'Type the core’s size.');
  const g = input.geometry;
  const r = radii(g);
  return {
    ...SIZE,
    title,
    description: describe(g, input),
    shapes: [...iron(g, r, input), ...fluxArrow(r, input.fluxPath ?? true), ...cable(r, input.turns), ...hotSpot(g, r, input.hottestSlot), ...middle(r, input), ...cableLine(input)],
    ...(input.heat ? { table: heatTable(input.heat, input.units ?? 'si') } : {}),
  };
}

function unknownCore(title: string, words: string): Drawing {
  return {
    ...SIZE,
    title,
    description: words,
    shapes: [
      { kind: 'path', d: circlePath(CENTRE, OUTER), stroke: 'line', strokeWidth: 1.2, dash: [5, 5] },
      { kind: 'path', d: circlePath(CENTRE, OUTER * 0.66), stroke: 'line', strokeWidth: 1.2, dash: [5, 5] },
      ...wrapped(words, 22).map((text, i, all): Shape => ({ kind: 'text', x: CENTRE.x, y: CENTRE.y + 4 + (i - (all.length - 1) / 2) * 15, text, size: 10.5, weight: 400, anchor: 'middle', ink: 'muted' })),
    ],
  };
}

function wrapped(words: string, width: number): string[] {
  const lines: string[] = [];
  for (const word of words.split(' ')) {
    const last = lines.at(-1);
    if (last !== undefined && `${last} ${word}`.length <= width) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines.slice(0, 5);
}

function iron(g: CoreGeometry, r: Radii, input: RingDrawingInput): Shape[] {
  const pitch = (2 * Math.PI) / g.slots;
  const shapes: Shape[] = [];
  const yoke = g.kind === 'stator' ? { from: r.slotBottom, to: r.outer } : { from: r.inner, to: r.slotBottom };
  const teeth = g.kind === 'stator' ? { from: r.slotMouth, to: r.slotBottom + 0.4 } : { from: r.slotBottom - 0.4, to: r.slotMouth };
  const tooth = (pitch * (1 - SLOT_SHARE)) / 2;
  for (let slot = 1; slot <= g.slots; slot += 1) {
    const middle = (slot - 1) * pitch;
    const fill = heatPaint(input.heat?.get(slot), input.heatFullK ?? 10);
    const mark = `slot-${slot}`;
    shapes.push({ kind: 'path', d: sectorPath(CENTRE, yoke.from, yoke.to, middle - pitch / 2, middle + pitch / 2), fill, stroke: fill, strokeWidth: 0.6, mark });
    // the tooth stands between this slot and the next
    shapes.push({ kind: 'path', d: sectorPath(CENTRE, teeth.from, teeth.to, middle + pitch / 2 - tooth, middle + pitch / 2 + tooth), fill, mark });
  }
  shapes.push({ kind: 'path', d: circlePath(CENTRE, g.kind === 'stator' ? r.outer : r.inner), stroke: 'text', strokeWidth: 1.5 });
  return [...shapes, ...slotNumbers(g, r)];
}

function hotSpot(g: CoreGeometry, r: Radii, slot: number | undefined): Shape[] {
  if (slot === undefined || !Number.isInteger(slot) || slot < 1 || slot > g.slots) return [];
  const p = polar(CENTRE, r.outer + 9, ((slot - 1) * 2 * Math.PI) / g.slots);
  return [{ kind: 'circle', cx: p.x, cy: p.y, r: 4, stroke: 'fails', strokeWidth: 2, mark: `slot-${slot}` }];
}

function slotNumbers(g: CoreGeometry, r: Radii): Shape[] {
  const every = Math.max(1, Math.ceil(g.slots / 4));
  return [1, 1 + every, 1 + 2 * every, 1 + 3 * every]
    .filter((slot) => slot <= g.slots)
    .map((slot): Shape => {
      const p = polar(CENTRE, r.outer + 10, ((slot - 1) * 2 * Math.PI) / g.slots);
      return { kind: 'text', x: p.x, y: p.y + 3, text: String(slot), size: 8.5, weight: 400, anchor: 'middle', ink: 'muted' };
    });
}

function fluxArrow(r: Radii, wanted: boolean): Shape[] {
  if (!wanted) return [];
  const yoke = r.slotMouth === r.inner ? (r.slotBottom + r.outer) / 2 : (r.inner + r.slotBottom) / 2;
  const from = polar(CENTRE, yoke, (-18 * Math.PI) / 180);
  const end = (-96 * Math.PI) / 180;
  const to = polar(CENTRE, yoke, end);
  const tip = polar(CENTRE, yoke, end - 0.09);
  const [left, right] = [polar(CENTRE, yoke - 4, end), polar(CENTRE, yoke + 4, end)];
  return [
    { kind: 'path', d: `${moveTo(from)}${arcTo(yoke, to, false)}`, stroke: 'steel', strokeWidth: 2.4, dash: [2, 4], cap: 'round' },
    { kind: 'path', d: `${moveTo(left)}${lineTo(tip)}${lineTo(right)}Z`, fill: 'steel' },
  ];
}

/** Each turn is a bar across the back iron: in through the middle, round the outside. */
function cable(r: Radii, turns: number): Shape[] {
  if (!Number.isFinite(turns) || turns < 1) return [];
  const drawn = Math.min(Math.round(turns), MOST_CABLES);
  const spread = Math.min((78 * Math.PI) / 180, (drawn - 1) * ((5.6 * Math.PI) / 180));
  const width = drawn > 12 ? 2.6 : 4.6;
  // in a narrow bore the turns leave room for the reading
  const inside = Math.max(4, Math.min(r.inner, r.slotMouth) - (r.inner < 60 ? 4 : 9));
  return Array.from({ length: drawn }, (_, i): Shape => {
    const angle = CABLE_AT + (drawn === 1 ? 0 : (i / (drawn - 1) - 0.5) * spread);
    return { kind: 'path', d: `${moveTo(polar(CENTRE, inside, angle))}${lineTo(polar(CENTRE, r.outer + 9, angle))}`, stroke: 'copper', strokeWidth: width, cap: 'round' };
  });
}

/** The reading stands in the bore; where the bore is too small for it, below the core. */
function middle(r: Radii, { reading }: RingDrawingInput): Shape[] {
  if (!reading) return [];
  const fits = r.inner >= 44;
  const at = fits ? { x: CENTRE.x, y: CENTRE.y - (r.inner < 60 ? 6 : 4) } : { x: SIZE.width - 6, y: 22 };
  const anchor = fits ? ('middle' as const) : ('end' as const);
  const size = fits ? Math.min(30, r.inner * 0.42) : 22;
  const lines: Shape[] = [
    { kind: 'text', x: at.x, y: at.y, text: reading.figure, size, weight: 600, anchor, ink: 'steel' },
    { kind: 'text', x: at.x, y: at.y + size * 0.55 + 2, text: reading.unit, size: 11, weight: 400, anchor, ink: 'muted' },
  ];
  if (reading.below !== undefined) lines.push({ kind: 'text', x: at.x, y: at.y + size * 0.55 + (r.inner < 60 ? 13 : 17), text: reading.below, size: r.inner < 60 ? 8.5 : 10.5, weight: 400, anchor, ink: 'muted' });
  return lines;
}

function cableLine({ cableWords, turns }: RingDrawingInput): Shape[] {
  const words = cableWords ?? (turns > MOST_CABLES ? `${Math.round(turns)} turns` : undefined);
  return words === undefined ? [] : [{ kind: 'text', x: 4, y: SIZE.height - 4, text: words, size: 11, weight: 600, anchor: 'start', ink: 'copper' }];
}

function heatTable(heat: ReadonlyMap<number, number>, units: UnitSystem): NonNullable<Drawing['table']> {
  const rows = [...heat.entries()].sort(([a], [b]) => a - b);
  return { columns: ['slot', `${unitOf('temperature-difference', units)} over mean`], rows: rows.map(([slot, k]) => [String(slot), toShown(k, 'temperature-difference', units).toFixed(1)]) };
}

function describe(g: CoreGeometry, input: RingDrawingInput): string {
  const units = input.units ?? 'si';
  const length = (m: number) => formatQuantity(m, 'length', units, { digits: units === 'si' ? 0 : 2 });
  const parts = [
    g.kind === 'stator' ? `Stator, outside ${length(g.outerDiameterM)}, bore ${length(g.innerDiameterM)}` : `Armature, outside ${length(g.outerDiameterM)}, inside ${length(g.innerDiameterM)}`,
    `${g.slots} slots ${length(g.slotDepthM)} deep`,
    ...(input.turns >= 1 ? [turnsInWords(input.turns)] : []),
    ...(input.reading ? [`${input.reading.figure} ${input.reading.unit}`] : []),
    ...(input.hottestSlot === undefined ? [] : [`hottest at slot ${input.hottestSlot}`]),
  ];
  return `${parts.join(', ')}.`;
}

function turnsInWords(turns: number): string {
  const count = Math.round(turns);
  if (count === 1) return 'one turn of the loop cable';
  return count > MOST_CABLES ? `${count} turns of the loop cable (${MOST_CABLES} drawn)` : `${count} turns of the loop cable`;
}
