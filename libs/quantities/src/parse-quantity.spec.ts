import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { KINDS, unitOf, type Kind, type UnitSystem } from './kinds.js';
import { parseQuantity, type ParseCode } from './parse-quantity.js';

const read = (text: string, kind: Kind = 'length', system: UnitSystem = 'si') => parseQuantity(text, kind, system);

describe('What a technician types is read as meant', () => {
  it.each<[string, Kind, UnitSystem, number, string]>([
    ['12,5', 'length', 'si', 0.0125, 'mm'],
    ['12.5', 'length', 'si', 0.0125, 'mm'],
    ['12,5 mm', 'length', 'inch-pound', 0.0125, 'mm'],
    ['0.5in', 'length', 'si', 0.0127, 'in'],
    ['.5"', 'length', 'si', 0.0127, 'in'],
    ['1 3/8', 'length', 'inch-pound', 0.034925, 'in'],
    ['1-3/8 in', 'length', 'si', 0.034925, 'in'],
    ['3/8"', 'length', 'si', 0.009525, 'in'],
    ['1½', 'length', 'inch-pound', 0.0381, 'in'],
    ['85 kl/in2', 'flux-density', 'si', 1.3175026350052701, 'kl/in²'],
    ['85', 'flux-density', 'inch-pound', 1.3175026350052701, 'kl/in²'],
    ['1 234,5', 'length', 'si', 1.2345, 'mm'],
    ["1'234.5", 'length', 'si', 1.2345, 'mm'],
    ['1.234,5', 'length', 'si', 1.2345, 'mm'],
    ['1,234.5', 'length', 'si', 1.2345, 'mm'],
    ['1,234,567', 'length', 'si', 1234.567, 'mm'],
    ['0,125', 'length', 'inch-pound', 0.003175, 'in'],
    ['1.5e2', 'length', 'si', 0.15, 'mm'],
    ['−40', 'temperature', 'inch-pound', -40, '°F'],
    ['300 K', 'temperature', 'si', 26.85, 'K'],
    ['18 F', 'temperature-difference', 'si', 10, '°F'],
    ['10 °C', 'temperature-difference', 'inch-pound', 10, 'K'],
    ['2.4 GΩ', 'resistance-mega', 'si', 2.4e9, 'GΩ'],
    ['13.31', 'resistance-milli', 'si', 0.01331, 'mΩ'],
    ['100 HP', 'rated-power', 'si', 74569.98715822703, 'hp'],
    ['200', 'rated-power', 'si', 200_000, 'kW'],
    ['18.6', 'percent', 'si', 0.186, '%'],
    ['20 min', 'duration', 'si', 20, 'min'],
    ['1 h', 'duration', 'si', 60, 'h'],
    ['72', 'count', 'si', 72, ''],
    ['1 500', 'count', 'si', 1500, ''],
  ])('“%s” for %s in %s', (text, kind, system, si, unit) => {
    expect(read(text, kind, system)).toEqual({ ok: true, si, unit, entered: text.trim() });
  });
  it('half a degree of angle is read in degrees and kept in radians', () => {
    expect(read('180', 'angle')).toMatchObject({ ok: true, si: Math.PI });
  });
  it('milliohms are not megohms', () => {
    expect(read('5 mΩ', 'resistance')).toMatchObject({ si: 0.005 });
    expect(read('5 MΩ', 'resistance')).toMatchObject({ si: 5e6 });
    expect(read('5 MOHM', 'resistance')).toMatchObject({ ok: false, code: 'unknown-unit' });
  });
});

describe('What cannot be read is refused with words, never guessed', () => {
  it.each<[string, Kind, ParseCode]>([
    ['', 'length', 'empty'],
    ['   ', 'length', 'empty'],
    ['abc', 'length', 'letters'],
    ['1O5', 'length', 'letters'],
    ['twelve', 'count', 'letters'],
    ['12 pieces', 'count', 'letters'],
    ['NaN', 'length', 'letters'],
    ['Infinity', 'length', 'letters'],
    ['∞', 'length', 'letters'],
    ['1.2.3', 'length', 'two-separators'],
    ['1,5,2', 'length', 'two-separators'],
    ['1,5.2', 'length', 'two-separators'],
    ['12,34.5', 'length', 'two-separators'],
    ['1,750', 'speed', 'ambiguous-separator'],
    ['12,500', 'length', 'ambiguous-separator'],
    ['12 5', 'length', 'not-a-number'],
    ['--3', 'length', 'not-a-number'],
    ['3-4', 'length', 'not-a-number'],
    ['5/0 in', 'length', 'not-a-number'],
    ['3/8', 'length', 'fraction'],
    ['1/2 kg', 'mass', 'fraction'],
    ['85 kg', 'length', 'wrong-dimension'],
    ['12 mm', 'mass', 'wrong-dimension'],
    ['50 Hz', 'voltage', 'wrong-dimension'],
    ['12 furlongs', 'length', 'unknown-unit'],
    ['12.5', 'count', 'not-whole'],
    ['1e999', 'length', 'not-finite'],
    ['9e307', 'rated-power', 'not-finite'],
  ])('“%s” for %s: %s', (text, kind, code) => {
    const result = read(text, kind);
    expect(result).toMatchObject({ ok: false, code });
    if (!result.ok) expect(result.words).toMatch(/\.$/);
  });
  it('says which unit the field wants', () => {
    const result = read('85 kg', 'length', 'inch-pound');
    expect(result.ok ? '' : result.words).toBe('kg measures mass. This field takes a length in in.');
  });
  it('never throws and never answers a number that is not finite, whatever is typed', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: 'binary', maxLength: 40 }), fc.stringMatching(/^[0-9.,' /eE+\-½"a-z]{0,20}$/)), fc.constantFrom(...KINDS), (text, kind) => {
        const result = parseQuantity(text, kind, 'inch-pound');
        if (result.ok) expect(Number.isFinite(result.si)).toBe(true);
        else expect(result.words.length).toBeGreaterThan(5);
      }),
      { numRuns: 2000 },
    );
  });
  it('comma and point mean the same in every unambiguous number', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 99999 }), fc.integer({ min: 0, max: 99 }), fc.constantFrom(...KINDS.filter((k) => k !== 'count')), (whole, part, kind) => {
        expect(read(`${whole},${part} ${unitOf(kind, 'si')}`, kind)).toMatchObject({ ok: true });
        const comma = read(`${whole},${part}`, kind);
        const point = read(`${whole}.${part}`, kind);
        expect(comma.ok && point.ok && comma.si === point.si).toBe(true);
      }),
    );
  });
});
