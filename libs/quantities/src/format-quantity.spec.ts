import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatQuantity, formatUsual } from './format-quantity.js';
import { KINDS } from './kinds.js';
import { OutOfRangeError } from './out-of-range-error.js';
import { parseQuantity } from './parse-quantity.js';

describe('Switching between systems loses nothing', () => {
  it('every figure written in full reads back as the very same number', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...KINDS.filter((k) => k !== 'count')),
        fc.constantFrom('si' as const, 'inch-pound' as const),
        fc.constantFrom('.' as const, ',' as const),
        fc.boolean(),
        // a temperature of 1e-300 °C would need three hundred digits in °F; no reading is that small
        fc.double({ noNaN: true, noDefaultInfinity: true }).filter((v) => v === 0 || Math.abs(v) > 1e-15),
        (kind, system, decimal, unit, value) => {
          const read = parseQuantity(formatQuantity(value, kind, system, { decimal, unit }), kind, system);
          expect(read).toMatchObject({ ok: true, si: value === 0 ? 0 : value });
        },
      ),
      { numRuns: 2000 },
    );
  });
  it('a length typed in millimetres stays itself after a visit to inches', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 5_000_000 }), (micrometres) => {
        const typed = parseQuantity(String(micrometres / 1000), 'length', 'si');
        if (!typed.ok) throw new Error(typed.words);
        const inches = parseQuantity(formatQuantity(typed.si, 'length', 'inch-pound'), 'length', 'inch-pound');
        if (!inches.ok) throw new Error(inches.words);
        expect(formatQuantity(inches.si, 'length', 'si', { unit: false })).toBe(String(micrometres / 1000));
      }),
    );
  });
});

describe('Figures are written as a shop writes them', () => {
  it.each([
    ['12.5 mm', formatQuantity(0.0125, 'length', 'si')],
    ['1.375 in', formatQuantity(0.034925, 'length', 'inch-pound')],
    ['85.0 kl/in²', formatUsual(1.3175, 'flux-density', 'inch-pound')],
    ['2.84 W/kg', formatUsual(2.84, 'specific-loss', 'si')],
    ['1.29 W/lb', formatUsual(2.84, 'specific-loss', 'inch-pound')],
    ['200 kW', formatQuantity(200_000, 'rated-power', 'si')],
    ['100.0 hp', formatUsual(74_570, 'rated-power', 'inch-pound')],
    ['18.6 %', formatQuantity(0.186, 'percent', 'si')],
    ['72', formatQuantity(72, 'count', 'si')],
    ['12,5 mm', formatQuantity(0.0125, 'length', 'si', { decimal: ',' })],
    ['12.5', formatQuantity(0.0125, 'length', 'si', { unit: false })],
    ['-5.1 %', formatUsual(-0.051, 'percent', 'si')],
    ['3.142 rad', `${formatQuantity(Math.PI, 'number', 'si', { digits: 3 })} rad`],
  ])('%s', (expected, written) => {
    expect(written).toBe(expected);
  });
  it('rounds half away from zero, of the figure as written', () => {
    expect(formatQuantity(1.005, 'number', 'si', { digits: 2 })).toBe('1.01');
    expect(formatQuantity(-1.005, 'number', 'si', { digits: 2 })).toBe('-1.01');
    expect(formatQuantity(9.996, 'number', 'si', { significant: 3 })).toBe('10.0');
  });
  it('never writes a minus before nothing', () => {
    expect(formatQuantity(-0.0001, 'number', 'si', { digits: 2 })).toBe('0.00');
    expect(formatQuantity(-0, 'length', 'si')).toBe('0 mm');
  });
  it('a decimal comma is never mistaken for thousands', () => {
    expect(formatQuantity(12.345, 'number', 'si', { decimal: ',' })).toBe('12,3450');
  });
  it.each([NaN, Infinity])('refuses to write %d', (value) => {
    expect(() => formatQuantity(value, 'length', 'si')).toThrow(OutOfRangeError);
  });
  it('refuses digits that make no sense', () => {
    expect(() => formatQuantity(1, 'length', 'si', { digits: -1 })).toThrow(OutOfRangeError);
    expect(() => formatQuantity(1, 'length', 'si', { digits: 21 })).toThrow(OutOfRangeError);
    expect(() => formatQuantity(1, 'length', 'si', { significant: 0 })).toThrow(OutOfRangeError);
    expect(formatQuantity(1, 'number', 'si', { digits: 20 })).toBe('1.00000000000000000000');
  });
});
