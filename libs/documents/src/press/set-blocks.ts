import type { Block, ColumnsBlock, FrameBlock } from './blocks.js';
import { type Mark, moved } from './marks.js';
import { columnWidths, setTable } from './set-table.js';
import { setText } from './set-text.js';
import { type Slug, stacked, takeUpTo, totalHeight } from './slug.js';
import type { Typeface } from './typeface.js';

export interface Measure {
  readonly widthPt: number;
  /** what fits on an empty page */
  readonly pageHeightPt: number;
  readonly typeface: Typeface;
}

/** Blocks to unbroken pieces, in reading order. */
export function setBlocks(blocks: readonly Block[], measure: Measure): Slug[] {
  return blocks.flatMap((block) => setBlock(block, measure));
}

function setBlock(block: Block, measure: Measure): Slug[] {
  const { widthPt, typeface } = measure;
  switch (block.kind) {
    case 'text':
      return setText(block, widthPt, typeface);
    case 'gap':
      return [{ heightPt: block.heightPt, marks: [], air: true, keepWithNext: false }];
    case 'rule':
      return [{ heightPt: block.thicknessPt, marks: [{ kind: 'line', x: 0, y: 0, toX: widthPt, toY: 0, ink: block.ink, thicknessPt: block.thicknessPt }], keepWithNext: true }];
    case 'table':
      return setTable(block, widthPt, typeface);
    case 'keep': {
      const slugs = setBlocks(block.blocks, measure);
      return totalHeight(slugs) <= measure.pageHeightPt ? [stacked(slugs)] : slugs;
    }
    case 'columns':
      return setColumns(block, measure);
    case 'frame':
      return setFrame(block, measure);
    case 'drawing': {
      const width = Math.min(block.widthPt, widthPt);
      const height = block.drawing.width > 0 ? (width * block.drawing.height) / block.drawing.width : 0;
      const x = leftOf(block.align, widthPt, width);
      return [{ heightPt: height, marks: [{ kind: 'drawing', x, y: 0, widthPt: width, heightPt: height, drawing: block.drawing }] }];
    }
    case 'marks': {
      const x = leftOf(block.align, widthPt, block.widthPt);
      return [{ heightPt: block.heightPt, marks: block.marks.map((mark) => moved(mark, x, 0)) }];
    }
  }
}

function leftOf(align: 'left' | 'right' | 'center' | undefined, widthPt: number, ownPt: number): number {
  const spare = Math.max(widthPt - ownPt, 0);
  return align === 'right' ? spare : align === 'center' ? spare / 2 : 0;
}

/** Columns side by side; where one is higher than a page they are broken together, page by page. */
function setColumns(block: ColumnsBlock, measure: Measure): Slug[] {
  const widths = columnWidths(block.columns, measure.widthPt, block.gapPt);
  let waiting = block.columns.map((column, index) => setBlocks(column.blocks, { ...measure, widthPt: Math.max(widths[index] ?? 0, 1) }));
  const slugs: Slug[] = [];
  while (waiting.some((column) => column.length > 0)) {
    const marks: Mark[] = [];
    let heightPt = 0;
    let x = 0;
    waiting = waiting.map((column, index) => {
      const [taken, left] = takeUpTo(column, measure.pageHeightPt);
      const stack = stacked(taken);
      for (const mark of stack.marks) marks.push(moved(mark, x, 0));
      heightPt = Math.max(heightPt, stack.heightPt);
      x += (widths[index] ?? 0) + block.gapPt;
      return left;
    });
    slugs.push({ heightPt, marks });
  }
  return slugs;
}

/** A framed note; a long one is framed again on every page it needs. */
function setFrame(block: FrameBlock, measure: Measure): Slug[] {
  const { paddingPt } = block;
  const inner: Measure = { ...measure, widthPt: Math.max(measure.widthPt - 2 * paddingPt, 1), pageHeightPt: Math.max(measure.pageHeightPt - 2 * paddingPt, 1) };
  let waiting = setBlocks(block.blocks, inner);
  const slugs: Slug[] = [];
  while (waiting.length > 0) {
    const [taken, left] = takeUpTo(waiting, inner.pageHeightPt);
    waiting = left;
    const stack = stacked(taken);
    const heightPt = stack.heightPt + 2 * paddingPt;
    const box: Mark = {
      kind: 'rect',
      x: 0,
      y: 0,
      widthPt: measure.widthPt,
      heightPt,
      stroke: block.ink,
      thicknessPt: block.thicknessPt ?? 0.7,
      ...(block.fill ? { fill: block.fill } : {}),
    };
    slugs.push({ heightPt, marks: [box, ...stack.marks.map((mark) => moved(mark, paddingPt, paddingPt))] });
  }
  return slugs;
}
