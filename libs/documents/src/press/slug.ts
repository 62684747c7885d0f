import { type Mark, moved } from './marks.js';

/** A piece of set matter that is never broken: a line of text, a table row, a drawing. Marks count from its upper left corner. */
export interface Slug {
  readonly heightPt: number;
  readonly marks: readonly Mark[];
  readonly keepWithNext?: boolean;
  /** set again at the top of the page when this piece is the first on it: the head of a table */
  readonly head?: Slug;
  /** air that is dropped at the top of a page */
  readonly air?: boolean;
}

export const totalHeight = (slugs: readonly Slug[]) => slugs.reduce((sum, slug) => sum + slug.heightPt, 0);

/** Several pieces as one that is not broken. */
export function stacked(slugs: readonly Slug[], keepWithNext = false): Slug {
  const marks: Mark[] = [];
  let y = 0;
  for (const slug of slugs) {
    for (const mark of slug.marks) marks.push(moved(mark, 0, y));
    y += slug.heightPt;
  }
  return { heightPt: y, marks, keepWithNext };
}

/** Cuts a list of pieces into stacks that are no higher than a page; each stack has at least one piece. */
export function takeUpTo(slugs: readonly Slug[], heightPt: number): [Slug[], Slug[]] {
  const taken: Slug[] = [];
  let height = 0;
  for (const slug of slugs) {
    if (taken.length > 0 && height + slug.heightPt > heightPt) break;
    taken.push(slug);
    height += slug.heightPt;
  }
  return [taken, slugs.slice(taken.length)];
}
