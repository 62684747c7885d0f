import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createLineSplitter, LONGEST_LINE } from './line-splitter.js';

function linesOf(...chunks: string[]): string[] {
  const lines: string[] = [];
  const splitter = createLineSplitter((text, line) => expect(lines.push(text)).toBe(line));
  for (const chunk of chunks) splitter.write(chunk);
  splitter.end();
  return lines;
}

describe('Lines of a stream', () => {
  it('end with LF, CR LF or CR', () => {
    expect(linesOf('a\nb\r\nc\rd')).toEqual(['a', 'b', 'c', 'd']);
    expect(linesOf('a\n\n\nb\n')).toEqual(['a', '', '', 'b']);
    expect(linesOf('a\r\rb')).toEqual(['a', '', 'b']);
  });
  it('are whole even where the stream is cut between CR and LF', () => {
    expect(linesOf('a\r', '\nb')).toEqual(['a', 'b']);
    expect(linesOf('a\r', '', '\nb')).toEqual(['a', 'b']);
    expect(linesOf('a\r', 'b')).toEqual(['a', 'b']);
  });
  it('lose the mark of the encoding at the start of the file, and only there', () => {
    expect(linesOf('\ufeffa\nb')).toEqual(['a', 'b']);
    expect(linesOf('', '\ufeff', 'a')).toEqual(['a']);
    expect(linesOf('a\n\ufeffb')).toEqual(['a', '\ufeffb']);
  });
  it('are none in an empty file', () => {
    expect(linesOf()).toEqual([]);
    expect(linesOf('', '')).toEqual([]);
  });
  it('past the longest are cut and not held', () => {
    const seen: [number, boolean][] = [];
    const splitter = createLineSplitter((text, _line, cut) => seen.push([text.length, cut]));
    for (let i = 0; i < 50; i += 1) splitter.write('x'.repeat(1000));
    splitter.write('\nok\n');
    splitter.end();
    expect(seen).toEqual([[LONGEST_LINE, true], [2, false]]);
  });
  it('are the same however the stream is cut', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom('a', '1;2', '\n', '\r', '\r\n', ''), { maxLength: 30 }), fc.array(fc.nat(60), { maxLength: 8 }), (pieces, cuts) => {
        const text = pieces.join('');
        const at = [...new Set([0, ...cuts.map((c) => Math.min(c, text.length)), text.length])].sort((a, b) => a - b);
        expect(linesOf(...at.slice(1).map((end, i) => text.slice(at[i], end)))).toEqual(linesOf(text));
      }),
    );
  });
});
