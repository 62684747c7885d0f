import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SEPARATORS, splitCells } from './row-cells.js';

describe('Cells of a row', () => {
  it('are cut at the separator, without blanks about them', () => {
    expect(splitCells(' 12:00 ; 20.5;;x', ';')).toEqual(['12:00', '20.5', '', 'x']);
    expect(splitCells('12:00\t20.5\t', '\t')).toEqual(['12:00', '20.5', '']);
    expect(splitCells('', ',')).toEqual(['']);
  });
  it('may stand in quotes with the separator inside', () => {
    expect(splitCells('"12:00","351,2","say ""hot"""', ',')).toEqual(['12:00', '351,2', 'say "hot"']);
  });
  it('end with the row where a quote is never closed', () => {
    expect(splitCells('a,"b,c', ',')).toEqual(['a', 'b,c']);
  });
  it('come back as they were written, whatever is in them', () => {
    fc.assert(
      fc.property(fc.array(fc.string({ unit: 'grapheme-ascii' }), { minLength: 1, maxLength: 6 }), fc.constantFrom(...SEPARATORS), (cells, separator) => {
        const trimmed = cells.map((c) => c.trim());
        expect(splitCells(trimmed.map((c) => `"${c.replaceAll('"', '""')}"`).join(separator), separator)).toEqual(trimmed);
      }),
    );
  });
});
