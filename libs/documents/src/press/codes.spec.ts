import { describe, expect, it } from 'vitest';
import { code128Mark, code128Widths, qrMark, qrModules } from './codes.js';

describe('codes on paper', () => {
  it('has the three finder patterns of a QR code, and timing between them', () => {
    // Source: ISO/IEC 18004, 6.3.3 and 6.3.5: finder 7 by 7 in three corners, timing in row and column 6.
    const modules = qrModules('https://shop.example/check/K7QX-3MNP');
    const size = modules.length;
    expect((size - 21) % 4).toBe(0);
    const finder = ['1111111', '1000001', '1011101', '1011101', '1011101', '1000001', '1111111'];
    for (const [top, left] of [[0, 0], [0, size - 7], [size - 7, 0]] as const) {
      expect(modules.slice(top, top + 7).map((row) => row.slice(left, left + 7).map(Number).join(''))).toEqual(finder);
    }
    for (let at = 8; at < size - 8; at += 1) {
      expect(modules[6]?.[at]).toBe(at % 2 === 0);
      expect(modules[at]?.[6]).toBe(at % 2 === 0);
    }
  });

  it('writes error level M into the format bits', () => {
    // Source: ISO/IEC 18004, 7.9: level M is 00 in the first two format bits, after the mask 101010000010010.
    const modules = qrModules('https://shop.example/check/K7QX-3MNP');
    const bits = [modules[8]?.[0], modules[8]?.[1]].map(Number);
    expect([bits[0]! ^ 1, bits[1]! ^ 0]).toEqual([0, 0]);
  });

  it('begins, checks and stops a Code 128 as the standard says', () => {
    // Source: ISO/IEC 15417: every character is 11 modules of three bars and three spaces, start B is 211214, stop 2331112.
    const widths = code128Widths('J-AB');
    expect(widths.slice(0, 6).join('')).toBe('211214');
    expect(widths.slice(-7).join('')).toBe('2331112');
    // start, four characters, check character, stop
    expect(widths).toHaveLength(6 * 6 + 7);
    // J is value 42, A is value 33 in the table of the standard
    expect(widths.slice(6, 12).join('')).toBe('112133');
    expect(widths.slice(18, 24).join('')).toBe('111323');
    for (let from = 0; from < widths.length - 7; from += 6) expect(widths.slice(from, from + 6).reduce((sum, width) => sum + width, 0)).toBe(11);
  });

  it('gives no code where the text would make one that cannot be read', () => {
    expect(qrMark('x'.repeat(500), 0, 0, 60)).toBeNull();
    expect(code128Mark('J-2026-0112-'.repeat(5), 0, 0, 200, 20)).toBeNull();
    expect(code128Mark('Łódź', 0, 0, 200, 20)).toBeNull();
    expect(code128Mark('J-2026-0112', 0, 0, 200, 20)).not.toBeNull();
  });
});
