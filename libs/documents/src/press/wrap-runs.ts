import type { Run, Sign } from './blocks.js';
import type { Ink } from './inks.js';
import type { Typeface, Weight } from './typeface.js';

/** A piece that stands on a line: where it begins, how wide it is. */
export type LinePiece = { readonly x: number; readonly widthPt: number; readonly sizePt: number } & (
  | { readonly text: string; readonly weight: Weight; readonly ink: Ink }
  | { readonly sign: Sign }
);

export interface SetLine {
  readonly pieces: readonly LinePiece[];
  readonly widthPt: number;
}

interface Word {
  readonly text: string;
  readonly weight: Weight;
  readonly ink: Ink;
  readonly sizePt: number;
  readonly widthPt: number;
  readonly spaceBefore: boolean;
  readonly sign?: Sign;
}

/** A sign is as wide as the figures beside it are high, with a little air. */
export const signWidth = (sizePt: number) => sizePt * 1.35;

type Token = Word | 'break';

function tokensOf(runs: readonly Run[], sizePt: number, typeface: Typeface): Token[] {
  const tokens: Token[] = [];
  let spaceBefore = false;
  for (const run of runs) {
    if ('sign' in run) {
      tokens.push({ text: '', sign: run.sign, weight: 'regular', ink: 'text', sizePt, widthPt: signWidth(sizePt), spaceBefore });
      spaceBefore = false;
      continue;
    }
    const weight = run.weight ?? 'regular';
    const size = run.sizePt ?? sizePt;
    for (const part of typeface.clean(run.text, weight).split(/(\n| +)/)) {
      if (part === '') continue;
      if (part === '\n') {
        tokens.push('break');
        spaceBefore = false;
      } else if (/^ +$/.test(part)) {
        spaceBefore = true;
      } else {
        tokens.push({ text: part, weight, ink: run.ink ?? 'text', sizePt: size, widthPt: typeface.widthOf(part, size, weight), spaceBefore });
        spaceBefore = false;
      }
    }
  }
  return tokens;
}

/** Cuts a word that is wider than its column, keeping combining marks with their letter. */
function cut(word: Word, firstPt: number, widthPt: number, typeface: Typeface): Word[] {
  const letters = word.text.match(/\P{M}\p{M}*|\p{M}+/gu) ?? [];
  const pieces: Word[] = [];
  let text = '';
  let room = firstPt;
  for (const letter of letters) {
    const next = text + letter;
    if (text !== '' && typeface.widthOf(next, word.sizePt, word.weight) > room) {
      // An address breaks behind a slash or a dash where one is near.
      const behind = Math.max(...['/', '-', '?', '&', '_', '.'].map((sign) => text.lastIndexOf(sign))) + 1;
      const keepTo = behind > text.length * 0.45 ? behind : text.length;
      const kept = text.slice(0, keepTo);
      pieces.push({ ...word, text: kept, widthPt: typeface.widthOf(kept, word.sizePt, word.weight), spaceBefore: pieces.length === 0 && word.spaceBefore });
      text = text.slice(keepTo) + letter;
      room = widthPt;
    } else {
      text = next;
    }
  }
  pieces.push({ ...word, text, widthPt: typeface.widthOf(text, word.sizePt, word.weight), spaceBefore: pieces.length === 0 && word.spaceBefore });
  return pieces;
}

/** Breaks runs into lines no wider than the column; words of one hand that touch are joined into one piece. */
export function wrapRuns(runs: readonly Run[], sizePt: number, widthPt: number, typeface: Typeface): SetLine[] {
  const lines: SetLine[] = [];
  let words: Word[] = [];
  let used = 0;
  const spaceOf = (word: Word) => typeface.widthOf(' ', word.sizePt, word.weight);
  const flush = () => {
    lines.push(joined(words, typeface));
    words = [];
    used = 0;
  };
  const put = (word: Word) => {
    const space = words.length > 0 && word.spaceBefore ? spaceOf(word) : 0;
    if (words.length > 0 && used + space + word.widthPt > widthPt + 0.01) {
      // What is glued to the word before it (a unit to its figure, a sign to its word) moves down with it.
      const carried: Word[] = [];
      let glued = word.spaceBefore;
      while (!glued && words.length > 1) {
        const last = words.pop();
        if (!last) break;
        carried.unshift(last);
        glued = last.spaceBefore;
      }
      const together = carried.reduce((sum, w) => sum + w.widthPt, 0) + word.widthPt;
      if (carried.length > 0 && (!glued || together > widthPt)) {
        words.push(...carried);
        carried.length = 0;
      }
      flush();
      for (const piece of carried) place(piece);
    }
    place(word);
  };
  const place = (word: Word) => {
    used += (words.length > 0 && word.spaceBefore ? spaceOf(word) : 0) + word.widthPt;
    words.push(word);
  };
  for (const token of tokensOf(runs, sizePt, typeface)) {
    if (token === 'break') {
      flush();
    } else if (token.widthPt > widthPt) {
      const room = Math.max(widthPt - used - (words.length > 0 ? spaceOf(token) : 0), 0);
      const pieces = cut(token, room > widthPt / 3 ? room : widthPt, widthPt, typeface);
      pieces.forEach((piece, index) => {
        if (index > 0 && words.length > 0) flush();
        put(index === 0 ? piece : { ...piece, spaceBefore: true });
      });
    } else {
      put(token);
    }
  }
  if (words.length > 0 || lines.length === 0) flush();
  return lines;
}

function joined(words: readonly Word[], typeface: Typeface): SetLine {
  const pieces: LinePiece[] = [];
  let x = 0;
  for (const word of words) {
    const space = pieces.length > 0 && word.spaceBefore ? typeface.widthOf(' ', word.sizePt, word.weight) : 0;
    const last = pieces.at(-1);
    if (word.sign !== undefined) {
      pieces.push({ x: x + space, widthPt: word.widthPt, sizePt: word.sizePt, sign: word.sign });
    } else if (last && 'text' in last && last.weight === word.weight && last.ink === word.ink && last.sizePt === word.sizePt) {
      const text = last.text + (space > 0 ? ' ' : '') + word.text;
      pieces[pieces.length - 1] = { ...last, text, widthPt: typeface.widthOf(text, word.sizePt, word.weight) };
    } else {
      pieces.push({ x: x + space, widthPt: word.widthPt, sizePt: word.sizePt, text: word.text, weight: word.weight, ink: word.ink });
    }
    x += space + word.widthPt;
  }
  return { pieces, widthPt: x };
}
