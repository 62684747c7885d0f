import { describe, expect, it } from 'vitest';
import { csvCell, csvLine } from './csv.js';

describe('cells of an export', () => {
  // OWASP, “CSV Injection”: cells beginning with = + - @ tab or carriage return
  it.each(['=1+1', '+49 361', '-2', '@SUM(A1)', '\tx', '\rx', '\0x', '＝1'])('%j is kept from being taken for a formula', (text) => {
    expect(csvCell(text).replace(/^"/, '').startsWith("'")).toBe(true);
  });

  // RFC 4180 section 2, rules 5 to 7
  it.each([
    ['a,b', '"a,b"'],
    ['say "no"', '"say ""no"""'],
    ['two\r\nlines', '"two\r\nlines"'],
    ['plain', 'plain'],
    ['', ''],
  ])('%j is written as %j', (text, cell) => {
    expect(csvCell(text)).toBe(cell);
  });

  it('numbers stay numbers, and nothing is nothing', () => {
    expect(csvLine([-2, true, null])).toBe('-2,true,\r\n');
  });
});
