import fc from 'fast-check';
import { erf } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { acceptanceLimit, conformanceProbability, normalShareBelow } from './conformance-probability.js';
import { OutOfRangeError } from './out-of-range-error.js';

describe('Examples of JCGM 106:2012 (from memory; each computed again with the normal distribution)', () => {
  it('clause 7.4, burst strength at least 490 kPa, 509.7 with u 8.6: 98.9 % conform', () => {
    expect(conformanceProbability(509.7, 8.6, { lower: 490 })).toBeCloseTo(0.989, 3);
  });
  it('clause 7.4, breakdown voltage at most −5.40 V, −5.47 with u 0.05: 92 % conform', () => {
    expect(conformanceProbability(-5.47, 0.05, { upper: -5.4 })).toBeCloseTo(0.919, 3);
  });
  it('clause 7.5, oil viscosity 12.5 to 16.3 mm²/s, 13.6 with u 1.8: 66 % conform', () => {
    expect(conformanceProbability(13.6, 1.8, { lower: 12.5, upper: 16.3 })).toBeCloseTo(0.66, 2);
  });
  // Table 1 of clause 7.3: distance to the limit in standard uncertainties, for a wanted probability.
  it.each([
    [0.8, 0.84], [0.9, 1.28], [0.95, 1.64], [0.99, 2.33], [0.999, 3.09],
  ])('for %d the limit must be %d standard uncertainties away', (probability, z) => {
    expect(conformanceProbability(0, 1, { upper: z + 0.005 })).toBeGreaterThan(probability);
    expect(conformanceProbability(0, 1, { upper: z - 0.005 })).toBeLessThan(probability);
  });
  it('at the limit itself the risk is shared: one half', () => {
    expect(conformanceProbability(20, 1.2, { upper: 20 })).toBe(0.5);
  });
  it('a one-sided guard of 1.645 u leaves at most 5 % false accept', () => {
    expect(conformanceProbability(acceptanceLimit(20, 1.645 * 1.2, 'upper'), 1.2, { upper: 20 })).toBeCloseTo(0.95, 4);
    expect(conformanceProbability(acceptanceLimit(20, 1.645 * 1.2, 'lower'), 1.2, { lower: 20 })).toBeCloseTo(0.95, 4);
  });
});

describe('The normal distribution', () => {
  it('agrees with a second implementation, mathjs', () => {
    for (let z = -5; z <= 5; z += 0.25) expect(normalShareBelow(z)).toBeCloseTo((1 + erf(z / Math.SQRT2)) / 2, 12);
  });
  // Source: tail values computed with a second implementation (scipy.stats.norm.sf).
  it('keeps its figures far out', () => {
    expect(normalShareBelow(-6) / 9.865876450376946e-10).toBeCloseTo(1, 10);
    expect(normalShareBelow(-10) / 7.61985302416047e-24).toBeCloseTo(1, 10);
    expect(normalShareBelow(-3.0000001) / normalShareBelow(-3)).toBeCloseTo(1, 6);
  });
  it('is a mirror: what is below z is above −z', () => {
    fc.assert(
      fc.property(fc.double({ min: -40, max: 40, noNaN: true }), (z) => {
        expect(normalShareBelow(z) + normalShareBelow(-z)).toBeCloseTo(1, 13);
      }),
    );
  });
  it('ends at 0 and 1', () => {
    expect(normalShareBelow(-Infinity)).toBe(0);
    expect(normalShareBelow(Infinity)).toBe(1);
    expect(normalShareBelow(0)).toBe(0.5);
    expect(() => normalShareBelow(NaN)).toThrow(OutOfRangeError);
  });
});

describe('Probability of conformity', () => {
  it('never leaves 0 to 1 and falls as the result climbs past an upper limit', () => {
    fc.assert(
      fc.property(fc.double({ min: -50, max: 50, noNaN: true }), fc.double({ min: 0, max: 5, noNaN: true }), (y, more) => {
        const p = conformanceProbability(y, 1, { upper: 3 });
        expect(p).toBeGreaterThanOrEqual(0);
        expect(p).toBeLessThanOrEqual(1);
        expect(conformanceProbability(y + more, 1, { upper: 3 })).toBeLessThanOrEqual(p + 1e-15);
      }),
    );
  });
  it('refuses what cannot be', () => {
    expect(() => conformanceProbability(NaN, 1, { upper: 1 })).toThrow(OutOfRangeError);
    expect(() => conformanceProbability(1, 0, { upper: 1 })).toThrow(OutOfRangeError);
    expect(() => conformanceProbability(1, Infinity, { upper: 1 })).toThrow(OutOfRangeError);
    expect(() => conformanceProbability(1, 1, {})).toThrow(/at least one limit/);
    expect(() => conformanceProbability(1, 1, { lower: 2, upper: 1 })).toThrow(OutOfRangeError);
    expect(() => acceptanceLimit(NaN, 1, 'upper')).toThrow(OutOfRangeError);
    expect(() => acceptanceLimit(1, -1, 'upper')).toThrow(OutOfRangeError);
  });
});
