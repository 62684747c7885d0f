import type { Drawing, Ink as DrawingInk, Paint, Shape, TextShape } from '@libs/drawings';
import { PAPER_INKS, rgbOf } from './inks.js';
import type { PageCanvas } from './page-canvas.js';

/** Where a drawing stands on its page, in points from the upper left corner. */
export interface DrawingBox {
  readonly x: number;
  readonly y: number;
  readonly widthPt: number;
  readonly heightPt: number;
}

/** The drawings' inks on white paper. */
export const DRAWING_INKS: Readonly<Record<DrawingInk, string>> = {
  text: PAPER_INKS.text,
  muted: PAPER_INKS.muted,
  line: PAPER_INKS.line,
  hair: PAPER_INKS.hair,
  card: PAPER_INKS.card,
  ground: PAPER_INKS.ground,
  copper: PAPER_INKS.copper,
  steel: PAPER_INKS.steel,
  conforms: PAPER_INKS.conforms,
  fails: PAPER_INKS['does-not-conform'],
  unsure: PAPER_INKS.inconclusive,
  invalid: PAPER_INKS['not-valid'],
};

/** Light enough that words on it are read, dark enough for a copier. */
const HATCH = { spacing: 6, angleDeg: -45, strokeWidth: 1.3, share: 0.45 } as const;

/** Paints a drawing into its box, to scale: the same model the screen paints. */
export function paintDrawing(canvas: PageCanvas, drawing: Drawing, box: DrawingBox, inks: Readonly<Record<DrawingInk, string>> = DRAWING_INKS): void {
  if (!(drawing.width > 0 && drawing.height > 0)) return;
  const scale = Math.min(box.widthPt / drawing.width, box.heightPt / drawing.height);
  for (const shape of drawing.shapes) paintShape(canvas, shape, { drawing, box, scale, inks });
}

interface Place {
  readonly drawing: Drawing;
  readonly box: DrawingBox;
  readonly scale: number;
  readonly inks: Readonly<Record<DrawingInk, string>>;
}

function paintShape(canvas: PageCanvas, shape: Shape, place: Place): void {
  const { box, scale, inks } = place;
  const outline = (d: string, style: Parameters<PageCanvas['path']>[4]) => canvas.path(d, box.x, box.y, scale, style);
  switch (shape.kind) {
    case 'path':
      return outline(shape.d, {
        ...inked(shape, inks, shape.opacity),
        ...(shape.evenOdd ? { evenOdd: true } : {}),
        ...(shape.dash ? { dash: shape.dash } : {}),
        ...(shape.cap === 'round' ? { roundCaps: true } : {}),
      });
    case 'circle':
      return outline(circlePath(shape.cx, shape.cy, shape.r), inked(shape, inks));
    case 'rect':
      return outline(rectPath(shape.x, shape.y, shape.width, shape.height, shape.radius ?? 0), inked(shape, inks));
    case 'hatch':
      if (shape.width <= 0 || shape.height <= 0) return;
      return outline(rectPath(shape.x, shape.y, shape.width, shape.height, 0), {
        hatch: { ink: mixed(inks.card, inks[shape.ink], HATCH.share), spacing: HATCH.spacing, angleDeg: HATCH.angleDeg, strokeWidth: HATCH.strokeWidth },
      });
    case 'text':
      return paintText(canvas, shape, place);
  }
}

function inked(shape: { readonly fill?: Paint; readonly stroke?: Paint; readonly strokeWidth?: number }, inks: Readonly<Record<DrawingInk, string>>, opacity = 1) {
  const colour = (paint: Paint) => mixed(inks.card, colourOf(paint, inks), opacity);
  return {
    ...(shape.fill !== undefined ? { fill: colour(shape.fill) } : {}),
    ...(shape.stroke !== undefined ? { stroke: colour(shape.stroke), strokeWidth: shape.strokeWidth ?? 1 } : {}),
  };
}

/** Words keep to the drawing: the paper's letters are not as wide as the screen's, and a name may be long. */
function paintText(canvas: PageCanvas, shape: TextShape, { drawing, box, scale, inks }: Place): void {
  const weight = shape.weight >= 600 ? 'bold' : 'regular';
  const text = canvas.typeface.clean(shape.text, weight).replaceAll('\n', ' ');
  const room = shape.anchor === 'start' ? drawing.width - shape.x : shape.anchor === 'end' ? shape.x : 2 * Math.min(shape.x, drawing.width - shape.x);
  const wanted = canvas.typeface.widthOf(text, shape.size, weight);
  const size = wanted > room && room > 0 ? (shape.size * room) / wanted : shape.size;
  const width = canvas.typeface.widthOf(text, size, weight);
  const x = shape.x - (shape.anchor === 'end' ? width : shape.anchor === 'middle' ? width / 2 : 0);
  canvas.text(text, box.x + x * scale, box.y + shape.y * scale, size * scale, weight, colourOf(shape.ink, inks));
}

function colourOf(paint: Paint, inks: Readonly<Record<DrawingInk, string>>): string {
  return typeof paint === 'string' ? inks[paint] : mixed(inks[paint.from], inks[paint.to], paint.share);
}

/** Share 0 is all `from`, 1 is all `to`; on white paper an opacity is a mixture with the paper. */
function mixed(from: string, to: string, share: number): string {
  const [a, b] = [rgbOf(from), rgbOf(to)];
  const part = (x: number, y: number) =>
    Math.round((x + (y - x) * share) * 255)
      .toString(16)
      .padStart(2, '0');
  return `#${part(a.red, b.red)}${part(a.green, b.green)}${part(a.blue, b.blue)}`;
}

function circlePath(cx: number, cy: number, r: number): string {
  return `M${cx - r} ${cy}A${r} ${r} 0 1 1 ${cx + r} ${cy}A${r} ${r} 0 1 1 ${cx - r} ${cy}Z`;
}

function rectPath(x: number, y: number, width: number, height: number, radius: number): string {
  const r = Math.max(Math.min(radius, width / 2, height / 2), 0);
  if (r === 0) return `M${x} ${y}H${x + width}V${y + height}H${x}Z`;
  const corner = (toX: number, toY: number) => `A${r} ${r} 0 0 1 ${toX} ${toY}`;
  return `M${x + r} ${y}H${x + width - r}${corner(x + width, y + r)}V${y + height - r}${corner(x + width - r, y + height)}H${x + r}${corner(x, y + height - r)}V${y + r}${corner(x + r, y)}Z`;
}
