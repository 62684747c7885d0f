import type { Block } from '../press/blocks.js';
import { type PageFrame, type SetPage, bodyHeight, bodyWidth, makePages } from '../press/make-pages.js';
import { type Mark, moved } from '../press/marks.js';
import { setBlocks } from '../press/set-blocks.js';
import { lineHeight, lineMarks } from '../press/set-text.js';
import { totalHeight } from '../press/slug.js';
import type { Typeface } from '../press/typeface.js';
import { wrapRuns } from '../press/wrap-runs.js';
import type { PaperSize } from './paper-model.js';
import { COMMON } from './words.js';

const MM = 72 / 25.4;

/** A4 by ISO 216, Letter by ANSI Y14.1: 210 × 297 mm, 8½ × 11 in. */
export const SHEETS: Record<PaperSize, { readonly widthPt: number; readonly heightPt: number }> = {
  A4: { widthPt: 595.28, heightPt: 841.89 },
  Letter: { widthPt: 612, heightPt: 792 },
};

export const LABEL: PageFrame = { widthPt: 100 * MM, heightPt: 62 * MM, marginPt: { top: 9, right: 10, bottom: 8, left: 10 } };

export function sheetFrame(size: PaperSize): PageFrame {
  const sheet = SHEETS[size];
  const side = size === 'A4' ? 42.5 : 51;
  return { ...sheet, marginPt: { top: 42, right: side, bottom: 56, left: side } };
}

/** A laid-out paper: what stands on it, and what runs round it. */
export interface LaidPaper {
  readonly frame: PageFrame;
  readonly blocks: readonly Block[];
  /** on every page after the first */
  readonly runningHead: string;
  /** at the foot of every page */
  readonly foot: string;
  readonly title: string;
  readonly subject: string;
  /** stands on the lower edge of the first page: what a label never gives up */
  readonly atFoot?: readonly Block[];
  /** false for a label: no foot, no head */
  readonly furniture: boolean;
}

function standing(pages: SetPage[], paper: LaidPaper, typeface: Typeface): SetPage[] {
  const { frame, atFoot } = paper;
  const [first, ...rest] = pages;
  if (!atFoot || !first) return pages;
  const slugs = setBlocks(atFoot, { widthPt: bodyWidth(frame), pageHeightPt: bodyHeight(frame), typeface });
  let y = frame.heightPt - frame.marginPt.bottom - totalHeight(slugs);
  const marks: Mark[] = [];
  for (const slug of slugs) {
    for (const mark of slug.marks) marks.push(moved(mark, frame.marginPt.left, y));
    y += slug.heightPt;
  }
  return [{ marks: [...first.marks, ...marks] }, ...rest];
}

const FOOT_PT = 6.3;

export function composePages(paper: LaidPaper, typeface: Typeface): SetPage[] {
  const { frame } = paper;
  const slugs = setBlocks(paper.blocks, { widthPt: bodyWidth(frame), pageHeightPt: bodyHeight(frame), typeface });
  const pages = standing(makePages(slugs, frame), paper, typeface);
  if (!paper.furniture) return pages;
  return pages.map((page, index) => ({ marks: [...(index > 0 ? head(paper, typeface) : []), ...page.marks, ...foot(paper, index + 1, pages.length, typeface)] }));
}

function head(paper: LaidPaper, typeface: Typeface): Mark[] {
  const { left, top } = paper.frame.marginPt;
  const width = bodyWidth(paper.frame);
  const [line] = wrapRuns([{ text: paper.runningHead, ink: 'muted' }], FOOT_PT, width, typeface);
  if (!line) return [];
  const y = top - 20;
  return [
    ...lineMarks(line, left, y, width, lineHeight(line, FOOT_PT), 'left'),
    { kind: 'line', x: left, y: y + 11, toX: left + width, toY: y + 11, ink: 'hair', thicknessPt: 0.5 },
  ];
}

function foot(paper: LaidPaper, page: number, pages: number, typeface: Typeface): Mark[] {
  const { left, bottom } = paper.frame.marginPt;
  const width = bodyWidth(paper.frame);
  const y = paper.frame.heightPt - bottom + 14;
  const pageWidth = 70;
  const marks: Mark[] = [{ kind: 'line', x: 0, y: 0, toX: width, toY: 0, ink: 'hair', thicknessPt: 0.5 }];
  const [number] = wrapRuns([{ text: COMMON.page(page, pages), ink: 'muted' }], FOOT_PT, pageWidth, typeface);
  if (number) marks.push(...lineMarks(number, width - pageWidth, 4, pageWidth, lineHeight(number, FOOT_PT), 'right'));
  wrapRuns([{ text: paper.foot, ink: 'muted' }], FOOT_PT, width - pageWidth - 12, typeface)
    .slice(0, 3)
    .forEach((line, index) => {
      const height = lineHeight(line, FOOT_PT, 1.25);
      marks.push(...lineMarks(line, 0, 4 + index * height, width - pageWidth - 12, height, 'left'));
    });
  return marks.map((mark) => moved(mark, left, y));
}
