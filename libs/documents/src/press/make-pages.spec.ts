import { describe, expect, it } from 'vitest';
import { FONTS } from '../../test/paper-fonts.js';
import { cell, gap, words, type Block } from './blocks.js';
import { type PageFrame, bodyHeight, bodyWidth, makePages } from './make-pages.js';
import { setBlocks } from './set-blocks.js';
import { Typeface } from './typeface.js';

const frame: PageFrame = { widthPt: 300, heightPt: 200, marginPt: { top: 20, right: 20, bottom: 20, left: 20 } };
const set = (blocks: readonly Block[]) => makePages(setBlocks(blocks, { widthPt: bodyWidth(frame), pageHeightPt: bodyHeight(frame), typeface: new Typeface(FONTS) }), frame);
const textsOf = (page: ReturnType<typeof set>[number] | undefined) => (page?.marks ?? []).flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []));
const rows = (count: number) => Array.from({ length: count }, (_, index) => ({ cells: [cell(`row ${index + 1}`), cell('x')] }));

describe('making pages', () => {
  it('repeats the head of a table on every page it goes on to', () => {
    const pages = set([{ kind: 'table', columns: [{}, {}], head: [cell('Head'), cell('B')], rows: rows(40), sizePt: 8 }]);
    expect(pages.length).toBeGreaterThan(2);
    for (const page of pages) expect(textsOf(page)[0]).toBe('Head');
    expect(pages.flatMap(textsOf).filter((text) => text.startsWith('row'))).toEqual(Array.from({ length: 40 }, (_, index) => `row ${index + 1}`));
  });

  it('never leaves a heading alone at the foot of a page', () => {
    for (let lines = 1; lines < 30; lines += 1) {
      const pages = set([...Array.from({ length: lines }, () => words('line', 8)), { kind: 'text', runs: [{ text: 'HEADING' }], sizePt: 8, keepWithNext: true }, gap(3), { kind: 'table', columns: [{}], head: [cell('Head')], rows: rows(3), sizePt: 8 }]);
      for (const page of pages) expect(textsOf(page).at(-1)).not.toBe('HEADING');
      for (const page of pages) expect(textsOf(page).at(-1)).not.toBe('Head');
    }
  });

  it('keeps everything above the lower margin, even a row that is higher than a page', () => {
    const long = 'word '.repeat(1500);
    const pages = set([
      { kind: 'table', columns: [{}, {}], head: [cell('Head'), cell('B')], rows: [{ cells: [cell(long), cell('x')] }], sizePt: 8 },
      { kind: 'columns', gapPt: 10, columns: [{ share: 1, blocks: [words(long, 8)] }, { share: 2, blocks: [words('short', 8)] }] },
      { kind: 'frame', ink: 'line', paddingPt: 6, blocks: [words(long, 8)] },
    ]);
    for (const page of pages) {
      for (const mark of page.marks) if (mark.kind === 'text') expect(mark.y).toBeLessThanOrEqual(181);
    }
    expect(pages.flatMap(textsOf).join(' ').match(/word/g)).toHaveLength(4500);
  });

  it('makes one empty page of nothing', () => {
    expect(set([])).toEqual([{ marks: [] }]);
  });
});
