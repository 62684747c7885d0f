import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeAgainstAsFound, resistanceAt, riseByResistanceK, unbalanceFraction } from './index.js';

// Source: IEEE 112 and NEMA MG 1 (234.5), IEC 60034-1 (235, aluminium 225), constants from memory; values computed.
describe('Resistance follows temperature', () => {
  it.each([[25, 75, 234.5, 1.19268], [25, 75, 235, 1.19231], [25, 75, 225, 1.2], [20, 95, 234.5, 1.2947], [25, 115, 234.5, 1.34682]])('from %d to %d °C with k = %d', (from, to, k, ratio) => {
    expect(resistanceAt(1, from, to, k)).toBeCloseTo(ratio, 5);
  });
  it('there and back is where it started', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-4, max: 1e3, noNaN: true }), fc.double({ min: -40, max: 200, noNaN: true }), fc.double({ min: -40, max: 200, noNaN: true }), (r, a, b) => {
        expect(resistanceAt(resistanceAt(r, a, b), b, a) / r).toBeCloseTo(1, 12);
      }),
    );
  });
  it.each([[0, 20, 20], [NaN, 20, 20], [1, -235, 20], [1, 20, -235], [1, NaN, 20]])('refuses %d Ω from %d to %d °C', (r, from, to) => expect(() => resistanceAt(r, from, to)).toThrow());
});

// Source: IEC 60034-1 8.6.2, from memory; values computed.
describe('Rise by resistance', () => {
  it('0.400 Ω cold at 22 °C and 0.512 Ω hot in a coolant of 30 °C is a rise of 64 K', () => {
    expect(riseByResistanceK(0.4, 22, 0.512, 30, 235)).toBeCloseTo(63.96, 2);
    expect(riseByResistanceK(0.4, 22, 0.512, 30)).toBeCloseTo(63.82, 2);
  });
  it('refuses a missing figure', () => {
    expect(() => riseByResistanceK(0, 22, 0.5, 30)).toThrow(/cold/);
    expect(() => riseByResistanceK(0.4, 22, NaN, 30)).toThrow(/hot/);
    expect(() => riseByResistanceK(0.4, NaN, 0.5, 30)).toThrow(/cold winding/);
    expect(() => riseByResistanceK(0.4, 22, 0.5, NaN)).toThrow(/coolant/);
  });
});

describe('Unbalance is the largest deviation from the mean', () => {
  // Source: examples published with the NEMA MG 1 definition: 1.1 %, 0.84 %, 2.5 %, 1.96 %.
  it.each([[[462, 463, 455], 0.01087], [[480, 476, 472], 0.0084], [[203, 210, 212], 0.0256], [[460, 467, 450], 0.01961]])('of %j', (values, fraction) => {
    expect(unbalanceFraction(values)).toBeCloseTo(fraction, 5);
  });
  it('0.512, 0.508 and 0.518 Ω are 1.040 % apart, not the 1.951 % of their spread', () => {
    expect(unbalanceFraction([0.512, 0.508, 0.518])).toBeCloseTo(0.0104, 5);
    expect((0.518 - 0.508) / ((0.512 + 0.508 + 0.518) / 3)).toBeCloseTo(0.01951, 4);
  });
  it('does not depend on order or unit', () => {
    const x = fc.double({ min: 0.01, max: 1000, noNaN: true });
    fc.assert(
      fc.property(x, x, x, fc.double({ min: 0.001, max: 1000, noNaN: true }), (a, b, c, k) => {
        expect(unbalanceFraction([c * k, a * k, b * k])).toBeCloseTo(unbalanceFraction([a, b, c]), 9);
      }),
    );
  });
  it.each([[[1, 0, 1]], [[1, NaN, 1]], [[1, -1, 1]], [[1]]])('refuses %j', (values) => expect(() => unbalanceFraction(values)).toThrow(/all three/));
});

// Source: common practice, -5 to +3 % at the same temperature.
describe('The new winding against the one found', () => {
  const at = (ohm: number, windingTemperatureC = 20) => ({ resistancesOhm: [ohm, ohm, ohm] as [number, number, number], windingTemperatureC, construction: 'random-wound' as const });
  it.each([[0.95, 'conforms'], [0.949, 'inconclusive'], [1.03, 'conforms'], [1.031, 'inconclusive'], [1, 'conforms']])('%d of it: %s', (share, verdict) => {
    expect(judgeAgainstAsFound(at(share), at(1)).verdict).toBe(verdict);
  });
  it('a warm reading is carried to the temperature of the cold one', () => {
    expect(judgeAgainstAsFound(at(resistanceAt(1, 20, 60), 60), at(1)).measured).toBeCloseTo(0, 12);
  });
});
