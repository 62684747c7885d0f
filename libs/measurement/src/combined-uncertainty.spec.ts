import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { combineCorrelated, combineUncorrelated, expanded } from './combined-uncertainty.js';
import { OutOfRangeError } from './out-of-range-error.js';

const source = (sensitivity: number, standardUncertainty: number) => ({ sensitivity, standardUncertainty });
const identity = (n: number) => Array.from({ length: n }, (_, i) => Array.from({ length: n }, (_v, j) => (i === j ? 1 : 0)));

describe('Uncertainties combine', () => {
  it('as the sides of a right angle when they have nothing to do with each other', () => {
    expect(combineUncorrelated([source(1, 3), source(1, 4)])).toBe(5);
    expect(combineUncorrelated([source(-2, 1.5), source(4, 1)])).toBe(5);
    expect(combineUncorrelated([])).toBe(0);
  });
  // Source: JCGM 100:2008 clause 5.2.2, example of ten resistors calibrated against one standard: u of the series is 10 × 100 mΩ = 1 Ω, not √10 × 100 mΩ (from memory).
  it('straight when ten resistors lean on one standard: 1 ohm, and not 0.32', () => {
    const ten = Array.from({ length: 10 }, () => source(1, 0.1));
    const all = Array.from({ length: 10 }, () => Array.from({ length: 10 }, () => 1));
    expect(combineCorrelated(ten, all)).toBeCloseTo(1, 12);
    expect(combineUncorrelated(ten)).toBeCloseTo(0.316, 3);
  });
  it('one meter used before and after cancels in the ratio', () => {
    expect(combineCorrelated([source(1, 0.01), source(-1, 0.01)], [[1, 1], [1, 1]])).toBe(0);
  });
  it('no correlation is the simple case', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.double({ min: -10, max: 10, noNaN: true }), fc.double({ min: 0, max: 10, noNaN: true })), { maxLength: 6 }), (rows) => {
        const sources = rows.map(([c, u]) => source(c, u));
        expect(combineCorrelated(sources, identity(sources.length))).toBeCloseTo(combineUncorrelated(sources), 8);
      }),
    );
  });
  it('expanded is k times standard', () => {
    expect(expanded(0.012)).toBeCloseTo(0.024, 12);
    expect(expanded(0.012, 3)).toBeCloseTo(0.036, 12);
    expect(expanded(0)).toBe(0);
  });
  it('refuses what cannot be', () => {
    expect(() => combineUncorrelated([source(NaN, 1)])).toThrow(OutOfRangeError);
    expect(() => combineUncorrelated([source(1, -1)])).toThrow(OutOfRangeError);
    expect(() => combineUncorrelated([source(1, Infinity)])).toThrow(OutOfRangeError);
    expect(() => combineCorrelated([source(1, 1)], [])).toThrow(/one row and one column/);
    expect(() => combineCorrelated([source(1, 1), source(1, 1)], [[1, 0.5], [0.4, 1]])).toThrow(/same both ways/);
    expect(() => combineCorrelated([source(1, 1), source(1, 1)], [[1, 1.1], [1.1, 1]])).toThrow(OutOfRangeError);
    expect(() => combineCorrelated([source(1, 1)], [[0.9]])).toThrow(OutOfRangeError);
    const contradiction = [[1, -1, -1], [-1, 1, -1], [-1, -1, 1]];
    expect(() => combineCorrelated([source(1, 1), source(1, 1), source(1, 1)], contradiction)).toThrow(/contradict/);
    expect(() => expanded(-1)).toThrow(OutOfRangeError);
    expect(() => expanded(1, 0)).toThrow(OutOfRangeError);
    expect(() => expanded(1, NaN)).toThrow(OutOfRangeError);
  });
});
