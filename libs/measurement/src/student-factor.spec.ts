import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { effectiveDegreesOfFreedom } from './effective-degrees.js';
import { OutOfRangeError } from './out-of-range-error.js';
import { studentCoverageFactor, studentShareBelow } from './student-factor.js';

const source = (standardUncertainty: number, degreesOfFreedom: number, sensitivity = 1) => ({ sensitivity, standardUncertainty, degreesOfFreedom });

describe('Coverage factor for a few readings', () => {
  // Source: JCGM 100 table G.2 (from memory), each value computed again with scipy 1.17.
  it.each([
    [1, 12.706205], [2, 4.302653], [5, 2.570582], [9, 2.262157], [10, 2.228139], [20, 2.085963], [50, 2.008559], [100, 1.983972], [7.5, 2.33304], [Infinity, 1.959964],
  ])('%d degrees of freedom take %d for 95 %%', (degrees, k) => expect(studentCoverageFactor(degrees, 0.95)).toBeCloseTo(k, 5));
  it.each([[1, 13.97], [5, 2.65], [10, 2.28], [20, 2.13], [50, 2.05], [Infinity, 2.0]])('%d degrees of freedom take %d where endless ones take 2', (degrees, k) => {
    expect(studentCoverageFactor(degrees, 0.9545)).toBeCloseTo(k, 2);
  });
  it('more degrees of freedom never need a larger factor, and the factor gives its share back', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 1e6, noNaN: true }), fc.double({ min: 1.001, max: 100, noNaN: true }), fc.double({ min: 0.5, max: 0.999, noNaN: true }), (degrees, times, probability) => {
        const k = studentCoverageFactor(degrees, probability);
        expect(studentCoverageFactor(degrees * times, probability)).toBeLessThanOrEqual(k * (1 + 1e-9));
        expect(studentShareBelow(k, degrees) - studentShareBelow(-k, degrees)).toBeCloseTo(probability, 9);
      }),
    );
  });
  it('the ends of the line', () => {
    expect(studentShareBelow(0, 3)).toBeCloseTo(0.5, 12);
    expect(studentShareBelow(Infinity, 3)).toBe(1);
    expect(studentShareBelow(-Infinity, 3)).toBe(0);
    expect(studentShareBelow(1, 1)).toBeCloseTo(0.75, 12); // Cauchy: ½ + arctan(1)/π
  });
  it('refuses what cannot be', () => {
    for (const bad of [0, -1, NaN]) expect(() => studentCoverageFactor(bad)).toThrow(OutOfRangeError);
    for (const bad of [0, 1, NaN]) expect(() => studentCoverageFactor(5, bad)).toThrow(OutOfRangeError);
    expect(() => studentCoverageFactor(0.1)).toThrow(OutOfRangeError);
    expect(() => studentShareBelow(NaN, 5)).toThrow(OutOfRangeError);
  });
});

describe('Effective degrees of freedom', () => {
  // Source: JCGM 100 annex G.4.1 (from memory): 0.25 % of 10, 0.57 % of 5, 0.82 % of 15 readings: u 1.03 %, 19.0, t 2.09, U 2.2 %.
  it('the worked case of three repeated inputs has 19.0', () => {
    const inputs = [source(0.25, 9), source(0.57, 4), source(0.82, 14)];
    expect(effectiveDegreesOfFreedom(inputs)).toBeCloseTo(19, 1);
    expect(studentCoverageFactor(19) * Math.hypot(0.25, 0.57, 0.82)).toBeCloseTo(2.2, 1);
  });
  // Source: JCGM 100 annex H.1 (from memory): gauge block, 25 nm of 18, 9.7 of 25.6, 2.9 of 50, 16.6 of 2: u 32 nm, 16, U99 93 nm.
  it('the gauge block has 16 and is known to 93 nanometres at 99 %', () => {
    const degrees = effectiveDegreesOfFreedom([source(25, 18), source(9.7, 25.6), source(2.9, 50), source(16.6, 2)]);
    expect(Math.floor(degrees)).toBe(16);
    expect(studentCoverageFactor(16, 0.99) * 32).toBeCloseTo(93, 0);
  });
  it('never lies below the least nor above the sum of its sources', () => {
    const one = fc.tuple(fc.double({ min: 1e-3, max: 10, noNaN: true }), fc.double({ min: 1, max: 100, noNaN: true }));
    fc.assert(
      fc.property(fc.array(one, { minLength: 1, maxLength: 6 }), (rows) => {
        const degrees = effectiveDegreesOfFreedom(rows.map(([u, nu]) => source(u, nu)));
        expect(degrees).toBeGreaterThanOrEqual(Math.min(...rows.map(([, nu]) => nu)) * (1 - 1e-9));
        expect(degrees).toBeLessThanOrEqual(rows.reduce((sum, [, nu]) => sum + nu, 0) * (1 + 1e-9));
      }),
    );
  });
  it('sources known surely leave no limit', () => {
    expect(effectiveDegreesOfFreedom([source(1, Infinity), source(2, Infinity)])).toBe(Infinity);
    expect(effectiveDegreesOfFreedom([source(1, 4), source(1, Infinity)])).toBeCloseTo(16, 12);
  });
  it('refuses what cannot be', () => {
    expect(() => effectiveDegreesOfFreedom([])).toThrow(OutOfRangeError);
    expect(() => effectiveDegreesOfFreedom([source(0, 5)])).toThrow(OutOfRangeError);
    expect(() => effectiveDegreesOfFreedom([source(1, 0)])).toThrow(OutOfRangeError);
    expect(() => effectiveDegreesOfFreedom([source(1, NaN)])).toThrow(OutOfRangeError);
    expect(() => effectiveDegreesOfFreedom([source(NaN, 5)])).toThrow(OutOfRangeError);
  });
});
