import type { Drawing } from '@libs/drawings';
import type { Ink } from './inks.js';
import type { Weight } from './typeface.js';

/**
 * What is printed, placed. Points from the upper left corner of the page (or of the slug that carries
 * it until it is placed), y downward; a text stands on its baseline.
 */
export type Mark = TextMark | LineMark | RectMark | PathMark | DrawingMark;

export interface TextMark {
  readonly kind: 'text';
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly sizePt: number;
  readonly weight: Weight;
  readonly ink: Ink;
  readonly widthPt: number;
}

export interface LineMark {
  readonly kind: 'line';
  readonly x: number;
  readonly y: number;
  readonly toX: number;
  readonly toY: number;
  readonly ink: Ink;
  readonly thicknessPt: number;
}

export interface RectMark {
  readonly kind: 'rect';
  readonly x: number;
  readonly y: number;
  readonly widthPt: number;
  readonly heightPt: number;
  readonly fill?: Ink;
  readonly stroke?: Ink;
  readonly thicknessPt?: number;
}

/** An SVG path in its own coordinates, scaled and moved to its place. */
export interface PathMark {
  readonly kind: 'path';
  readonly x: number;
  readonly y: number;
  readonly scale: number;
  readonly d: string;
  readonly fill?: Ink;
  readonly stroke?: Ink;
  /** in the path's own coordinates */
  readonly strokeWidth?: number;
  readonly evenOdd?: boolean;
}

export interface DrawingMark {
  readonly kind: 'drawing';
  readonly x: number;
  readonly y: number;
  readonly widthPt: number;
  readonly heightPt: number;
  readonly drawing: Drawing;
}

export function moved(mark: Mark, dx: number, dy: number): Mark {
  if (mark.kind === 'line') return { ...mark, x: mark.x + dx, y: mark.y + dy, toX: mark.toX + dx, toY: mark.toY + dy };
  return { ...mark, x: mark.x + dx, y: mark.y + dy };
}
