import { describe, expect, it } from 'vitest';
import { FONTS } from '../../test/paper-fonts.js';
import { Typeface } from './typeface.js';

describe('the typeface', () => {
  it('has every sign a shop writes: letters of neighbours, units, comparison and money signs', () => {
    const typeface = new Typeface(FONTS);
    const text = 'Łódź Straße Ångström Čapek İzmir Ελλάδα Завод Ω ° ± µ μ ≤ ≥ € ² ³ √ × → Δ ϑ − “ ” … – —';
    for (const weight of ['regular', 'bold'] as const) expect(typeface.clean(text, weight)).toBe(text.normalize('NFC'));
    expect(typeface.replaced).toEqual([]);
  });

  it('puts a visible mark where a character has no glyph, and says which', () => {
    const typeface = new Typeface(FONTS);
    expect(typeface.clean('漢字 motor')).toBe('\ufffd\ufffd motor');
    expect(typeface.replaced).toEqual(['字', '漢']);
  });

  it('drops control characters and direction overrides, keeps line breaks', () => {
    expect(new Typeface(FONTS).clean('a\u0000b\u202egpj\u200b\r\nc\td')).toBe('abgpj\nc d');
  });

  it('composes a letter and its accent into one', () => {
    expect(new Typeface(FONTS).clean('Lo\u0301dz\u0301')).toBe('Lódź');
  });

  it('sets all figures equally wide, so that columns of figures stand', () => {
    const typeface = new Typeface(FONTS);
    for (const weight of ['regular', 'bold'] as const) {
      const widths = [...'0123456789'].map((figure) => typeface.widthOf(figure, 10, weight));
      expect(new Set(widths).size).toBe(1);
    }
  });
});
