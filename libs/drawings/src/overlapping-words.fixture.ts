import type { Drawing } from './drawing.js';
import { textExtent, textsOf } from './drawn-extent.fixture.js';

/** Pairs of words that lie on each other: for the specs of this library only. */
export function overlapping(drawing: Drawing): string[] {
  const texts = textsOf(drawing).map((t) => ({ text: t.text, ...textExtent(t) }));
  return texts.flatMap((a, i) => texts.slice(i + 1).filter((b) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom).map((b) => `${a.text} / ${b.text}`));
}
