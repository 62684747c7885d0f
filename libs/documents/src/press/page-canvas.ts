import {
  appendBezierCurve,
  beginText,
  clip,
  clipEvenOdd,
  closePath,
  concatTransformationMatrix,
  endPath,
  endText,
  fill as fillPath,
  lineTo,
  moveTo,
  type PDFFont,
  type PDFName,
  type PDFOperator,
  PDFOperator as Operator,
  PDFOperatorNames,
  type PDFPage,
  popGraphicsState,
  pushGraphicsState,
  setDashPattern,
  setFillingRgbColor,
  setFontAndSize,
  setLineCap,
  setLineWidth,
  setStrokingRgbColor,
  setTextMatrix,
  showText,
  stroke as strokePath,
} from 'pdf-lib';
import { rgbOf } from './inks.js';
import { readPath, type Segment } from './svg-path.js';
import type { Typeface, Weight } from './typeface.js';

/** Three decimals of a point are a third of a micrometre; more only makes the file long and its bytes doubtful. */
const tidy = (value: number) => {
  const rounded = Math.round(value * 1000) / 1000;
  return Object.is(rounded, -0) ? 0 : rounded;
};

export interface PathStyle {
  readonly fill?: string;
  readonly stroke?: string;
  readonly strokeWidth?: number;
  readonly evenOdd?: boolean;
  readonly dash?: readonly number[];
  readonly roundCaps?: boolean;
  readonly hatch?: { readonly ink: string; readonly spacing: number; readonly angleDeg: number; readonly strokeWidth: number };
}

/** A page seen from its upper left corner, y downward, as all our layouts count. Colours come as #RRGGBB. */
export class PageCanvas {
  private readonly fontNames = new Map<Weight, PDFName>();
  private readonly operators: PDFOperator[] = [];
  private readonly heightPt: number;

  constructor(
    private readonly page: PDFPage,
    private readonly fonts: Readonly<Record<Weight, PDFFont>>,
    readonly typeface: Typeface,
  ) {
    this.heightPt = page.getHeight();
  }

  /** Writes what was drawn into the page. */
  finish(): void {
    this.page.pushOperators(...this.operators);
    this.operators.length = 0;
  }

  text(text: string, x: number, y: number, sizePt: number, weight: Weight, colour: string, turnDeg = 0): void {
    if (text === '') return;
    const turn = (-turnDeg * Math.PI) / 180;
    const cos = tidy(Math.cos(turn));
    const sin = tidy(Math.sin(turn));
    const { red, green, blue } = rgbOf(colour);
    this.operators.push(
      setFillingRgbColor(tidy(red), tidy(green), tidy(blue)),
      beginText(),
      setFontAndSize(this.fontName(weight), tidy(sizePt)),
      setTextMatrix(cos, sin, tidy(-sin), cos, tidy(x), tidy(this.heightPt - y)),
      showText(this.fonts[weight].encodeText(text)),
      endText(),
    );
  }

  line(x: number, y: number, toX: number, toY: number, thicknessPt: number, colour: string): void {
    const { red, green, blue } = rgbOf(colour);
    this.operators.push(
      setStrokingRgbColor(tidy(red), tidy(green), tidy(blue)),
      setLineWidth(tidy(thicknessPt)),
      moveTo(tidy(x), tidy(this.heightPt - y)),
      lineTo(tidy(toX), tidy(this.heightPt - toY)),
      strokePath(),
    );
  }

  /** A path of its own coordinates, drawn with its origin at x, y and this scale. */
  path(d: string, x: number, y: number, scale: number, style: PathStyle): void {
    const segments = segmentsOf(d);
    if (segments.length === 0) return;
    this.operators.push(pushGraphicsState(), concatTransformationMatrix(tidy6(scale), 0, 0, tidy6(-scale), tidy(x), tidy(this.heightPt - y)));
    if (style.hatch) this.hatch(segments, style.hatch, style.evenOdd === true);
    if (style.fill) {
      const { red, green, blue } = rgbOf(style.fill);
      this.operators.push(setFillingRgbColor(tidy(red), tidy(green), tidy(blue)), ...traced(segments), style.evenOdd ? FILL_EVEN_ODD : fillPath());
    }
    if (style.stroke) {
      const { red, green, blue } = rgbOf(style.stroke);
      this.operators.push(setStrokingRgbColor(tidy(red), tidy(green), tidy(blue)), setLineWidth(tidy(style.strokeWidth ?? 1)));
      if (style.dash) this.operators.push(setDashPattern(style.dash.map(tidy), 0));
      if (style.roundCaps) this.operators.push(setLineCap(1));
      this.operators.push(...traced(segments), strokePath());
    }
    this.operators.push(popGraphicsState());
  }

  /** Parallel lines, cut to the outline. */
  private hatch(segments: readonly Segment[], hatch: NonNullable<PathStyle['hatch']>, evenOdd: boolean): void {
    const { red, green, blue } = rgbOf(hatch.ink);
    const box = boxOf(segments);
    const angle = (hatch.angleDeg * Math.PI) / 180;
    const along = { x: Math.cos(angle), y: Math.sin(angle) };
    const across = { x: -along.y, y: along.x };
    const middle = { x: (box.left + box.right) / 2, y: (box.top + box.bottom) / 2 };
    const reach = Math.hypot(box.right - box.left, box.bottom - box.top) / 2 + hatch.spacing;
    const lines = Math.min(Math.ceil(reach / Math.max(hatch.spacing, 0.5)), 400);
    this.operators.push(pushGraphicsState(), ...traced(segments), evenOdd ? clipEvenOdd() : clip(), endPath());
    this.operators.push(setStrokingRgbColor(tidy(red), tidy(green), tidy(blue)), setLineWidth(tidy(hatch.strokeWidth)));
    for (let line = -lines; line <= lines; line += 1) {
      const from = { x: middle.x + across.x * line * hatch.spacing, y: middle.y + across.y * line * hatch.spacing };
      this.operators.push(
        moveTo(tidy(from.x - along.x * reach), tidy(from.y - along.y * reach)),
        lineTo(tidy(from.x + along.x * reach), tidy(from.y + along.y * reach)),
      );
    }
    this.operators.push(strokePath(), popGraphicsState());
  }

  private fontName(weight: Weight): PDFName {
    const known = this.fontNames.get(weight);
    if (known) return known;
    const name = this.page.node.newFontDictionary(weight === 'bold' ? 'B' : 'R', this.fonts[weight].ref);
    this.fontNames.set(weight, name);
    return name;
  }
}

const FILL_EVEN_ODD = Operator.of(PDFOperatorNames.FillEvenOdd);
const tidy6 = (value: number) => Math.round(value * 1e6) / 1e6;

/** Symbols repeat on every row of a table; their paths are read once. */
const read = new Map<string, readonly Segment[]>();
function segmentsOf(d: string): readonly Segment[] {
  if (d.length > 200) return readPath(d);
  const known = read.get(d);
  if (known) return known;
  const segments = readPath(d);
  if (read.size < 200) read.set(d, segments);
  return segments;
}

function traced(segments: readonly Segment[]): PDFOperator[] {
  return segments.map((segment) => {
    if (segment.to === 'close') return closePath();
    if (segment.to === 'curve') return appendBezierCurve(tidy(segment.x1), tidy(segment.y1), tidy(segment.x2), tidy(segment.y2), tidy(segment.x), tidy(segment.y));
    return segment.to === 'move' ? moveTo(tidy(segment.x), tidy(segment.y)) : lineTo(tidy(segment.x), tidy(segment.y));
  });
}

function boxOf(segments: readonly Segment[]): { left: number; right: number; top: number; bottom: number } {
  const box = { left: Infinity, right: -Infinity, top: Infinity, bottom: -Infinity };
  for (const segment of segments) {
    if (segment.to === 'close') continue;
    box.left = Math.min(box.left, segment.x);
    box.right = Math.max(box.right, segment.x);
    box.top = Math.min(box.top, segment.y);
    box.bottom = Math.max(box.bottom, segment.y);
  }
  return box;
}
