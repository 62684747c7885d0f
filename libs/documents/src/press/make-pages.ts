import { type Mark, moved } from './marks.js';
import type { Slug } from './slug.js';

export interface PageFrame {
  readonly widthPt: number;
  readonly heightPt: number;
  readonly marginPt: { readonly top: number; readonly right: number; readonly bottom: number; readonly left: number };
}

export interface SetPage {
  readonly marks: readonly Mark[];
}

export const bodyHeight = (frame: PageFrame) => frame.heightPt - frame.marginPt.top - frame.marginPt.bottom;
export const bodyWidth = (frame: PageFrame) => frame.widthPt - frame.marginPt.left - frame.marginPt.right;

/**
 * Puts the pieces on pages. Pieces that are to stay together move to the next page together where they
 * fit on one; a table that goes on over a page shows its head again.
 */
export function makePages(slugs: readonly Slug[], frame: PageFrame): SetPage[] {
  const { top, left } = frame.marginPt;
  const bottom = frame.heightPt - frame.marginPt.bottom;
  const pages: Mark[][] = [[]];
  let y = top;
  let atTop = true;

  const put = (slug: Slug) => {
    for (const mark of slug.marks) pages.at(-1)?.push(moved(mark, left, y));
    y += slug.heightPt;
    atTop = false;
  };
  const turn = (first: Slug) => {
    pages.push([]);
    y = top;
    atTop = true;
    // Where both do not fit on one page, the matter matters more than its head.
    if (first.head && first.head.heightPt + first.heightPt <= bodyHeight(frame)) put(first.head);
  };

  for (let index = 0; index < slugs.length; ) {
    const group = together(slugs, index);
    const height = group.reduce((sum, slug) => sum + slug.heightPt, 0);
    const fitsAPage = height + (group[0]?.head?.heightPt ?? 0) <= bodyHeight(frame);
    if (y + height <= bottom + 0.01) {
      for (const slug of group) if (!(slug.air && atTop)) put(slug);
    } else if (fitsAPage && !atTop) {
      const first = group[0];
      if (first?.air) {
        // Air at the break is swallowed by it.
        index += 1;
        continue;
      }
      if (first) turn(first);
      for (const slug of group) put(slug);
    } else {
      for (const slug of group) {
        if (y + slug.heightPt > bottom + 0.01 && !atTop) turn(slug);
        if (!(slug.air && atTop)) put(slug);
      }
    }
    index += group.length;
  }
  return pages.map((marks) => ({ marks }));
}

function together(slugs: readonly Slug[], from: number): Slug[] {
  const group: Slug[] = [];
  for (let index = from; index < slugs.length; index += 1) {
    const slug = slugs[index];
    if (!slug) break;
    group.push(slug);
    // Air inside a group does not part it: a heading keeps its table across the gap.
    if (!slug.keepWithNext && !(slug.air && group.length > 1)) break;
  }
  return group;
}
