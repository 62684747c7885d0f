import { describe, expect, it } from 'vitest';
import { FONTS } from '../../test/paper-fonts.js';
import { Typeface } from './typeface.js';
import { type SetLine, wrapRuns } from './wrap-runs.js';

const typeface = new Typeface(FONTS);
const wordsOf = (lines: readonly SetLine[]) => lines.map((line) => line.pieces.map((piece) => ('text' in piece ? piece.text : `[${piece.sign}]`)).join('|'));

describe('breaking lines', () => {
  it('breaks at spaces and keeps every line inside its column', () => {
    const text = 'The core was restacked and tested again in the same set-up, cold, on the following morning.';
    const lines = wrapRuns([{ text }], 8, 120, typeface);
    expect(lines.length).toBeGreaterThan(2);
    for (const line of lines) expect(line.widthPt).toBeLessThanOrEqual(120.01);
    expect(wordsOf(lines).join(' ')).toBe(text);
  });

  it('cuts a word that is wider than its column and loses none of it', () => {
    const word = 'x'.repeat(300);
    const lines = wrapRuns([{ text: word }], 8, 60, typeface);
    for (const line of lines) expect(line.widthPt).toBeLessThanOrEqual(60.01);
    expect(wordsOf(lines).join('')).toBe(word);
  });

  it('breaks an address behind a slash rather than in a name', () => {
    const lines = wordsOf(wrapRuns([{ text: 'https://shop.example/check/abcdefghijklm' }], 8, 118, typeface));
    expect(lines).toEqual(['https://shop.example/check/', 'abcdefghijklm']);
  });

  it('keeps a figure with the unit that is joined to it', () => {
    const runs = [{ text: 'about three words then ' }, { text: '3.70' }, { text: '\u00a0W/kg', ink: 'muted' as const }];
    for (let width = 40; width < 140; width += 3) {
      const lines = wordsOf(wrapRuns(runs, 8, width, typeface));
      expect(lines.some((line) => line.includes('3.70|\u00a0W/kg'))).toBe(true);
    }
  });

  it('keeps a verdict’s sign beside its word', () => {
    const lines = wordsOf(wrapRuns([{ text: 'some words before ' }, { sign: 'conforms' }, { text: 'conforms', weight: 'bold' }], 8, 80, typeface));
    expect(lines.some((line) => line.includes('[conforms]|conforms'))).toBe(true);
  });

  it('gives one empty line for no words, and a line for each break', () => {
    expect(wrapRuns([], 8, 50, typeface)).toHaveLength(1);
    expect(wordsOf(wrapRuns([{ text: 'a\n\nb' }], 8, 50, typeface))).toEqual(['a', '', 'b']);
  });
});
