import type { Drawing, Shape } from './drawing.js';
import { digits } from './pen.js';

export interface SpineSheet {
  readonly id: string;
  readonly label: string;
  /** skipped: the route goes past this step, by a waiver or a changed route */
  readonly state: 'done' | 'open' | 'to-come' | 'skipped';
  /** the gate in front of this sheet */
  readonly gate: 'open' | 'shut' | 'none';
}

export interface SpineDrawingInput {
  readonly sheets: readonly SpineSheet[];
  readonly variant: 'full' | 'mini';
  readonly title?: string;
}

const FULL = { width: 260, sheet: 20, openSheet: 32, gap: 7, left: 8, sheetWidth: 56, openWidth: 72, edge: 1 } as const;
const MINI = { sheet: 6, openSheet: 7, gap: 2, height: 18 } as const;

/** Where each sheet of a full spine lies, so that a screen can lay its links over them. */
export interface SheetPlace {
  readonly id: string;
  readonly y: number;
  readonly height: number;
}

export function spinePlaces(sheets: readonly SpineSheet[]): SheetPlace[] {
  let y: number = FULL.edge;
  return sheets.map((sheet) => {
    const height = sheet.state === 'open' ? FULL.openSheet : FULL.sheet;
    const place = { id: sheet.id, y, height };
    y += height + FULL.gap;
    return place;
  });
}

/**
 * A job's route as a stack of laminations: done sheets dark, the open one copper and drawn out, sheets to come in outline,
 * skipped ones a dashed line;
 * a gate is the gap before its sheet, with a notch that is open or shut.
 *
 * @returns the full spine (260 units wide, labels beside the sheets) or the mini one for a table row (18 units high, no words).
 * @throws never.
 *
 * Source: own drawing.
 */
export function spineDrawing(input: SpineDrawingInput): Drawing {
  const title = input.title ?? 'Route of the job';
  const open = input.sheets.find((s) => s.state === 'open');
  const done = input.sheets.filter((s) => s.state === 'done').length;
  const skipped = input.sheets.filter((s) => s.state === 'skipped').length;
  const steps = input.sheets.length - skipped;
  const description = `${done} of ${steps} steps done${open ? `; at ${open.label}` : ''}${skipped > 0 ? `; ${skipped} skipped` : ''}.`;
  return input.variant === 'mini' ? { ...mini(input.sheets), title, description } : { ...full(input.sheets), title, description };
}

function full(sheets: readonly SpineSheet[]): Pick<Drawing, 'width' | 'height' | 'shapes'> {
  const places = spinePlaces(sheets);
  const shapes: Shape[] = [];
  sheets.forEach((sheet, i) => {
    const { y, height } = places[i]!;
    const open = sheet.state === 'open';
    if (sheet.state === 'skipped') shapes.push(skippedSheet(FULL.left, y + height / 2, FULL.sheetWidth, sheet.id));
    else shapes.push({
      kind: 'rect',
      x: open ? 0 : FULL.left,
      y,
      width: open ? FULL.openWidth : FULL.sheetWidth,
      height,
      radius: 1.5,
      ...(sheet.state === 'to-come' ? { stroke: 'line', strokeWidth: 1.2 } : { fill: open ? 'copper' : 'text' }),
      mark: sheet.id,
    });
    shapes.push({ kind: 'text', x: 88, y: y + height / 2 + 4.6, text: sheet.label, size: open ? 14.5 : 13, weight: open ? 700 : 400, anchor: 'start', ink: sheet.state === 'to-come' || sheet.state === 'skipped' ? 'muted' : 'text', mark: sheet.id });
    shapes.push(...notch(sheet.gate, y));
  });
  const last = places.at(-1);
  return { width: FULL.width, height: last ? last.y + last.height + FULL.edge : 0, shapes };
}

const skippedSheet = (x: number, y: number, width: number, mark?: string): Shape => ({
  kind: 'path',
  d: `M${digits(x)} ${digits(y)}L${digits(x + width)} ${digits(y)}`,
  stroke: 'line',
  strokeWidth: 1.6,
  dash: [3, 4],
  ...(mark === undefined ? {} : { mark }),
});

/** The gap before a gated sheet: a short bar when open, crossed by a bolt when shut. */
function notch(gate: SpineSheet['gate'], y: number): Shape[] {
  if (gate === 'none') return [];
  const middle = y - FULL.gap / 2;
  const bar: Shape = { kind: 'path', d: `M60 ${digits(middle)}L76 ${digits(middle)}`, stroke: gate === 'open' ? 'conforms' : 'fails', strokeWidth: 2.6 };
  if (gate === 'open') return [bar];
  return [bar, { kind: 'path', d: `M68 ${digits(middle - 6)}L68 ${digits(middle + 6)}`, stroke: 'fails', strokeWidth: 2.6 }];
}

function mini(sheets: readonly SpineSheet[]): Pick<Drawing, 'width' | 'height' | 'shapes'> {
  let x = 0;
  const shapes = sheets.map((sheet): Shape => {
    const open = sheet.state === 'open';
    const width = open ? MINI.openSheet : MINI.sheet;
    if (sheet.state === 'skipped') {
      const line = skippedSheet(x, MINI.height / 2, width);
      x += width + MINI.gap;
      return line;
    }
    const shape: Shape = {
      kind: 'rect',
      x: x + (sheet.state === 'to-come' ? 0.5 : 0),
      y: open ? 0 : 3,
      width: width - (sheet.state === 'to-come' ? 1 : 0),
      height: open ? MINI.height : MINI.height - 6,
      ...(sheet.state === 'to-come' ? { stroke: 'line', strokeWidth: 1 } : { fill: open ? 'copper' : 'text' }),
    };
    x += width + MINI.gap;
    return shape;
  });
  return { width: Math.max(1, x - MINI.gap), height: MINI.height, shapes };
}
