import type { Cell, TableBlock, TableRow } from './blocks.js';
import type { Ink } from './inks.js';
import type { Mark } from './marks.js';
import { lineHeight, lineMarks } from './set-text.js';
import type { Slug } from './slug.js';
import type { Typeface } from './typeface.js';
import { type SetLine, wrapRuns } from './wrap-runs.js';

/** Fixed widths first, the rest by shares. Never less than nothing, whatever was asked for. */
export function columnWidths(columns: readonly { readonly share?: number; readonly widthPt?: number }[], widthPt: number, gutterPt: number): number[] {
  const free = widthPt - gutterPt * Math.max(columns.length - 1, 0);
  const fixed = columns.reduce((sum, column) => sum + (column.widthPt ?? 0), 0);
  const shares = columns.reduce((sum, column) => sum + (column.widthPt === undefined ? (column.share ?? 1) : 0), 0);
  const left = Math.max(free - fixed, 0);
  return columns.map((column) => column.widthPt ?? (shares > 0 ? (left * (column.share ?? 1)) / shares : 0));
}

interface PlacedCell {
  readonly x: number;
  readonly widthPt: number;
  readonly align: 'left' | 'right' | 'center';
  readonly lines: readonly SetLine[];
}

/** A row higher than this many lines is broken like running text. */
const UNBROKEN_LINES = 14;

/** The rows of a table, each a slug that knows the head to repeat. */
export function setTable(block: TableBlock, widthPt: number, typeface: Typeface): Slug[] {
  const gutterPt = block.gutterPt ?? 8;
  const paddingPt = block.paddingPt ?? 2.4;
  const widths = columnWidths(block.columns, widthPt, gutterPt);
  const left = widths.map((_, index) => widths.slice(0, index).reduce((sum, w) => sum + w + gutterPt, 0));

  const placed = (cells: readonly Cell[]): PlacedCell[] => {
    let index = 0;
    return cells.map((cell) => {
      const span = Math.max(cell.span ?? 1, 1);
      const last = Math.min(index + span, widths.length) - 1;
      const x = left[index] ?? 0;
      const width = Math.max((left[last] ?? 0) + (widths[last] ?? 0) - x, 1);
      const align = cell.align ?? block.columns[index]?.align ?? 'left';
      index += span;
      return { x, widthPt: width, align, lines: wrapRuns(cell.runs, block.sizePt, width, typeface) };
    });
  };

  const rowSlug = (cells: readonly PlacedCell[], lineAbove: Ink | null, thicknessPt: number, first: boolean, last: boolean): Slug => {
    const marks: Mark[] = [];
    if (lineAbove) marks.push({ kind: 'line', x: 0, y: 0, toX: widthPt, toY: 0, ink: lineAbove, thicknessPt });
    let heightPt = 0;
    for (const cell of cells) {
      let y = first ? paddingPt : 0;
      for (const line of cell.lines) {
        const height = lineHeight(line, block.sizePt);
        marks.push(...lineMarks(line, cell.x, y, cell.widthPt, height, cell.align));
        y += height;
      }
      heightPt = Math.max(heightPt, y + (last ? paddingPt : 0));
    }
    return { heightPt, marks };
  };

  const head = block.head ? { ...rowSlug(placed(block.head), null, 0, true, true), keepWithNext: true } : undefined;
  const slugs: Slug[] = head ? [head] : [];
  block.rows.forEach((row: TableRow, index) => {
    const cells = placed(row.cells);
    const most = cells.reduce((lines, cell) => Math.max(lines, cell.lines.length), 1);
    const above: Ink | null = row.bare ? null : row.heavy ? 'text' : index === 0 && head ? 'line' : index === 0 ? null : 'hair';
    for (let from = 0; from < most; from += UNBROKEN_LINES) {
      const part = cells.map((cell) => ({ ...cell, lines: cell.lines.slice(from, from + UNBROKEN_LINES) }));
      const last = from + UNBROKEN_LINES >= most;
      const slug = rowSlug(part, from === 0 ? above : null, row.heavy ? 0.9 : 0.5, from === 0, last);
      slugs.push({ ...slug, ...(head ? { head } : {}), keepWithNext: row.keepWithNext === true });
    }
  });
  return slugs;
}
