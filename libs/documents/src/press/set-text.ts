import type { Align, TextBlock } from './blocks.js';
import type { Mark } from './marks.js';
import { signMarks } from './sign-marks.js';
import type { Slug } from './slug.js';
import type { Typeface } from './typeface.js';
import { type SetLine, wrapRuns } from './wrap-runs.js';

export const LEADING = 1.36;
/** Where the baseline stands in a line of this leading: the font's capitals sit in the optical middle. */
const BASELINE_SHARE = 0.73;

export function lineHeight(line: SetLine, sizePt: number, leading = LEADING): number {
  return line.pieces.reduce((size, piece) => Math.max(size, piece.sizePt), sizePt) * leading;
}

/** The marks of one line whose upper edge is at y. */
export function lineMarks(line: SetLine, x: number, y: number, widthPt: number, heightPt: number, align: Align): Mark[] {
  const spare = Math.max(widthPt - line.widthPt, 0);
  const left = x + (align === 'right' ? spare : align === 'center' ? spare / 2 : 0);
  const baseline = y + heightPt * BASELINE_SHARE;
  return line.pieces.flatMap((piece): Mark[] =>
    'sign' in piece
      ? signMarks(piece.sign, left + piece.x, baseline, piece.sizePt)
      : [{ kind: 'text', x: left + piece.x, y: baseline, text: piece.text, sizePt: piece.sizePt, weight: piece.weight, ink: piece.ink, widthPt: piece.widthPt }],
  );
}

/** A slug a line, the first kept with the second so that no line stands alone at the foot of a page. */
export function setText(block: TextBlock, widthPt: number, typeface: Typeface): Slug[] {
  const sizePt = fittingSize(block, widthPt, typeface);
  const all = wrapRuns(block.runs, sizePt, widthPt, typeface);
  const lines = block.maxLines !== undefined && all.length > block.maxLines ? shortened(all, block.maxLines, widthPt, typeface) : all;
  return lines.map((line, index) => {
    const heightPt = lineHeight(line, sizePt, block.leading);
    return {
      heightPt,
      marks: lineMarks(line, 0, 0, widthPt, heightPt, block.align ?? 'left'),
      keepWithNext: block.keepWithNext === true || (index === 0 && lines.length > 1),
    };
  });
}

function fittingSize(block: TextBlock, widthPt: number, typeface: Typeface): number {
  let sizePt = block.sizePt;
  while (block.smallestPt !== undefined && sizePt > block.smallestPt && wrapRuns(block.runs, sizePt, widthPt, typeface).length > 1) {
    sizePt = Math.max(sizePt - 0.5, block.smallestPt);
  }
  return sizePt;
}

const MORE = '…';

/** The first lines, the last of them ending in a sign that there was more. */
function shortened(lines: readonly SetLine[], most: number, widthPt: number, typeface: Typeface): SetLine[] {
  const kept = lines.slice(0, most);
  const last = kept.at(-1);
  const piece = last?.pieces.at(-1);
  if (!last || !piece || !('text' in piece)) return kept;
  const width = (text: string) => typeface.widthOf(text, piece.sizePt, piece.weight);
  let text = piece.text;
  while (text !== '' && piece.x + width(text + MORE) > widthPt) text = [...text].slice(0, -1).join('');
  text += MORE;
  const pieces = [...last.pieces.slice(0, -1), { ...piece, text, widthPt: width(text) }];
  return [...kept.slice(0, -1), { pieces, widthPt: piece.x + width(text) }];
}
