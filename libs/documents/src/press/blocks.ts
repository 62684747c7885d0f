import type { Drawing } from '@libs/drawings';
import type { Ink } from './inks.js';
import type { Mark } from './marks.js';
import type { Weight } from './typeface.js';

/** The signs that stand in a line of text: the verdict marks, and the sign of a figure shown without a judgement. */
export type Sign = 'conforms' | 'does-not-conform' | 'inconclusive' | 'not-valid' | 'shown-not-judged';

/** A piece of a line: words in one hand, or a sign. */
export type Run = { readonly text: string; readonly weight?: Weight; readonly ink?: Ink; readonly sizePt?: number } | { readonly sign: Sign };

export type Align = 'left' | 'right' | 'center';

/** What a layout is made of. It knows nothing of pages: the setter breaks it into them. */
export type Block = TextBlock | GapBlock | RuleBlock | ColumnsBlock | TableBlock | KeepBlock | FrameBlock | DrawingBlock | MarksBlock;

export interface TextBlock {
  readonly kind: 'text';
  readonly runs: readonly Run[];
  readonly sizePt: number;
  readonly align?: Align;
  readonly leading?: number;
  /** stays with what follows: a heading */
  readonly keepWithNext?: boolean;
  /** on a label: no more lines than this, the last one ending in “…” */
  readonly maxLines?: number;
  /** on a label: set smaller, down to this, before it takes a second line */
  readonly smallestPt?: number;
}

export interface GapBlock {
  readonly kind: 'gap';
  readonly heightPt: number;
}

export interface RuleBlock {
  readonly kind: 'rule';
  readonly ink: Ink;
  readonly thicknessPt: number;
}

export interface ColumnsBlock {
  readonly kind: 'columns';
  readonly gapPt: number;
  /** a share of what is left after the fixed ones, or a width in points */
  readonly columns: readonly { readonly share?: number; readonly widthPt?: number; readonly blocks: readonly Block[] }[];
}

export interface TableColumn {
  readonly share?: number;
  readonly widthPt?: number;
  readonly align?: Align;
}

export interface Cell {
  readonly runs: readonly Run[];
  readonly align?: Align;
  /** how many columns it covers; 1 unless told */
  readonly span?: number;
}

export interface TableRow {
  readonly cells: readonly Cell[];
  /** a heavier line above: totals */
  readonly heavy?: boolean;
  /** no line above */
  readonly bare?: boolean;
  readonly keepWithNext?: boolean;
}

export interface TableBlock {
  readonly kind: 'table';
  readonly columns: readonly TableColumn[];
  readonly head: readonly Cell[] | null;
  readonly rows: readonly TableRow[];
  readonly sizePt: number;
  readonly paddingPt?: number;
  readonly gutterPt?: number;
}

/** Not broken over a page where it fits on one. */
export interface KeepBlock {
  readonly kind: 'keep';
  readonly blocks: readonly Block[];
}

export interface FrameBlock {
  readonly kind: 'frame';
  readonly ink: Ink;
  readonly thicknessPt?: number;
  readonly fill?: Ink;
  readonly paddingPt: number;
  readonly blocks: readonly Block[];
}

export interface DrawingBlock {
  readonly kind: 'drawing';
  readonly drawing: Drawing;
  readonly widthPt: number;
  readonly align?: Align;
}

/** Ready marks in a box of their own: the shop's mark, a code. */
export interface MarksBlock {
  readonly kind: 'marks';
  readonly widthPt: number;
  readonly heightPt: number;
  readonly marks: readonly Mark[];
  readonly align?: Align;
}

export const gap = (heightPt: number): GapBlock => ({ kind: 'gap', heightPt });
export const rule = (ink: Ink = 'hair', thicknessPt = 0.5): RuleBlock => ({ kind: 'rule', ink, thicknessPt });
export const keep = (...blocks: readonly Block[]): KeepBlock => ({ kind: 'keep', blocks });
export const words = (text: string, sizePt = 8, ink: Ink = 'text', weight: Weight = 'regular', align: Align = 'left'): TextBlock => ({
  kind: 'text',
  runs: [{ text, ink, weight }],
  sizePt,
  align,
});
export const cell = (text: string, style: { weight?: Weight; ink?: Ink; align?: Align; span?: number } = {}): Cell => ({
  runs: [{ text, ...(style.weight ? { weight: style.weight } : {}), ...(style.ink ? { ink: style.ink } : {}) }],
  ...(style.align ? { align: style.align } : {}),
  ...(style.span ? { span: style.span } : {}),
});
