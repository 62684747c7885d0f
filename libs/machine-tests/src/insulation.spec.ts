import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { insulationCorrectionTo40C, insulationMinimum, insulationTestVolts, polarizationIndex } from './index.js';

// Source: IEEE 43-2013 correction formulas, from memory; values computed from them.
describe('Carrying an insulation resistance to 40 °C', () => {
  it.each([[10, 0.125], [20, 0.25], [25, 0.3536], [30, 0.5], [40, 1], [50, 2], [60, 4]])('halving at %d °C', (t, k) => {
    expect(insulationCorrectionTo40C(t, 'halving')).toBeCloseTo(k, 4);
  });
  it.each([[10, 0.656], [20, 0.7622], [25, 0.8186], [30, 0.877], [40, 1], [50, 1.5195], [60, 2.2517], [70, 3.2609], [80, 4.6245]])('the rule of 2013 at %d °C', (t, k) => {
    expect(insulationCorrectionTo40C(t, 'thermosetting')).toBeCloseTo(k, 4);
  });
  it('the rule of 2013 at its upper end, 85 °C', () => {
    expect(insulationCorrectionTo40C(85, 'thermosetting')).toBeCloseTo(5.467, 3);
  });
  it('200 MΩ at 25 °C is 70.7 MΩ by halving and 163.7 MΩ by the rule of 2013', () => {
    expect(200 * insulationCorrectionTo40C(25, 'halving')).toBeCloseTo(70.7, 1);
    expect(200 * insulationCorrectionTo40C(25, 'thermosetting')).toBeCloseTo(163.7, 1);
  });
  it('a warmer winding always gains by the correction', () => {
    fc.assert(
      fc.property(fc.double({ min: 10, max: 84, noNaN: true }), fc.double({ min: 0.1, max: 1, noNaN: true }), (t, step) => {
        for (const rule of ['halving', 'thermosetting'] as const) expect(insulationCorrectionTo40C(t + step, rule)).toBeGreaterThan(insulationCorrectionTo40C(t, rule));
      }),
    );
  });
  it.each([[9.99, 'thermosetting'], [85.01, 'thermosetting'], [-20.1, 'halving'], [130.1, 'halving'], [NaN, 'halving'], [Infinity, 'halving']] as const)('%d °C is outside the %s rule', (t, rule) => {
    expect(() => insulationCorrectionTo40C(t, rule)).toThrow(/holds from/);
  });
});

// Source: IEEE 43 table of test voltages, as quoted in a source that was read.
describe('Test volts follow the rated volts', () => {
  it.each([[24, 500, 500], [400, 500, 500], [999, 500, 500], [1000, 500, 1000], [2500, 500, 1000], [2501, 1000, 2500], [5000, 1000, 2500], [5001, 2500, 5000], [12000, 2500, 5000], [12001, 5000, 10000], [13800, 5000, 10000]])(
    'a winding of %d V is tested with %d to %d V DC',
    (rated, leastV, mostV) => expect(insulationTestVolts(rated)).toEqual({ leastV, mostV }),
  );
  it.each([0, -400, NaN])('rated volts of %d are refused', (v) => expect(() => insulationTestVolts(v)).toThrow(/rated volts/));
});

// Source: IEEE 43-2013, from memory; kV + 1 quoted from the 1974 edition in a source that was read.
describe('The least insulation resistance at 40 °C', () => {
  it.each([
    ['random-wound', 400, 5e6], ['random-wound', 690, 5e6], ['form-wound', 999, 5e6], ['form-wound', 1000, 100e6], ['form-wound', 6600, 100e6], ['dc-armature', 440, 5e6], ['field', 400, 1.4e6], ['field', 220, 1.22e6],
  ] as const)('%s of %d V', (windingKind, ratedVoltageV, ohm) => {
    expect(insulationMinimum({ windingKind, ratedVoltageV }).value).toBeCloseTo(ohm, 3);
    expect(insulationMinimum({ windingKind, ratedVoltageV }).source).toMatch(/IEEE 43/);
  });
});

describe('The polarization index', () => {
  it('is ten minutes over one minute', () => expect(polarizationIndex(800e6, 2000e6)).toBe(2.5));
  it.each([[0, 1], [1, 0], [NaN, 1], [1, -1]])('refuses %d and %d', (one, ten) => expect(() => polarizationIndex(one, ten)).toThrow(/more than 0/));
});
