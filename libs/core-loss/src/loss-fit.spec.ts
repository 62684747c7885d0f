import { seededUniform } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitLinear } from './linear-fit.js';
import { fitThreeTermLoss, fitTwoTermLoss, type LossPoint, type ThreeTermFit, type TwoTermFit } from './loss-fit.js';

const points = (rows: readonly (readonly number[])[], standardUncertaintyRel?: number): LossPoint[] =>
  rows.map(([frequencyHz = NaN, fluxDensityT = NaN, wattsPerKg = NaN]) => ({ frequencyHz, fluxDensityT, wattsPerKg, ...(standardUncertaintyRel === undefined ? {} : { standardUncertaintyRel }) }));
const fitted = <T extends TwoTermFit | ThreeTermFit>(fit: T): Extract<T, { outcome: 'fitted' }> => {
  if (fit.outcome !== 'fitted') throw new Error(fit.reasons.map((r) => r.code).join());
  return fit as Extract<T, { outcome: 'fitted' }>;
};
const codes = (fit: TwoTermFit | ThreeTermFit) => (fit.outcome === 'fitted' ? fit.notes : fit.reasons).map((r) => r.code);

// Source: pyleecan material file of M400-50A (Apache-2.0).
const strip = points([[50, 0.5, 0.46], [50, 1, 1.49], [50, 1.3, 2.46], [100, 0.5, 1.27], [100, 1, 4.15], [100, 1.3, 6.88], [200, 0.5, 3.33], [200, 1, 11.7], [200, 1.3, 20.2]], 0.02);

describe('Two parts from many readings', () => {
  // Second implementation: scipy 1.17 curve_fit with absolute sigma; its uncertainties times √(χ²/6) for the spread.
  it('finds the coefficients, the exponent and their uncertainties that a second implementation finds', () => {
    const fit = fitted(fitTwoTermLoss(strip, 'fit'));
    expect(fit.hysteresis.value).toBeCloseTo(0.0209116, 6);
    expect(fit.exponent.value).toBeCloseTo(1.603871, 4);
    expect(fit.eddy.value).toBeCloseTo(2.012508e-4, 8);
    expect(fit.chiSquared).toBeCloseTo(25.9004, 3);
    expect(fit.degreesOfFreedom).toBe(6);
    const spread = Math.sqrt(25.9004 / 6);
    expect(fit.hysteresis.standardUncertainty / (5.36867e-4 * spread)).toBeCloseTo(1, 3);
    expect(fit.exponent.standardUncertainty / (0.0309031 * spread)).toBeCloseTo(1, 3);
    expect(fit.eddy.standardUncertainty / (5.23384e-6 * spread)).toBeCloseTo(1, 3);
    expect(fit.correlation).toBeCloseTo(-0.8462, 3);
  });
  it('and with the exponent stated', () => {
    const fit = fitted(fitTwoTermLoss(strip, 2));
    expect(fit.hysteresis.value).toBeCloseTo(0.02160494, 8);
    expect(fit.eddy.value).toBeCloseTo(2.0326e-4, 8);
    expect(fit.exponent).toEqual({ value: 2, standardUncertainty: 0 });
  });
  it('gives back what readings without error were made of', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-3, max: 0.1, noNaN: true }), fc.double({ min: 0.1, max: 2, noNaN: true }), fc.double({ min: 1.4, max: 2.4, noNaN: true }), (kh, share, n) => {
        const ke = (share * kh) / 100;
        const made = [25, 50, 100].flatMap((f) => [0.7, 1, 1.4].map((b) => [f, b, kh * f * b ** n + ke * (f * b) ** 2]));
        const fit = fitted(fitTwoTermLoss(points(made), 'fit'));
        expect(fit.hysteresis.value / kh).toBeCloseTo(1, 4);
        expect(fit.eddy.value / ke).toBeCloseTo(1, 3);
        expect(fit.exponent.value).toBeCloseTo(n, 3);
        expect(Math.max(...fit.residualsRel.map(Math.abs))).toBeLessThan(1e-4);
      }),
      { numRuns: 60 },
    );
  });
  it('states an uncertainty that holds the truth 95 times of 100', () => {
    const uniform = seededUniform(7);
    const score = () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
    let held = 0;
    for (let i = 0; i < 1000; i += 1) {
      const made = [25, 50, 100].flatMap((f) => [0.9, 1.1, 1.3].map((b) => [f, b, (0.02 * f * b ** 2 + 1e-4 * (f * b) ** 2) * (1 + 0.01 * score())]));
      const fit = fitted(fitTwoTermLoss(points(made, 0.01), 2));
      if (Math.abs(fit.eddy.value - 1e-4) <= 1.96 * fit.eddy.standardUncertainty) held += 1;
    }
    expect(held).toBeGreaterThan(930);
    expect(held).toBeLessThan(985);
  });
  it('names why it cannot tell', () => {
    expect(codes(fitTwoTermLoss(points([[50, 1, 1.5]])))).toEqual(['too-few']);
    expect(codes(fitTwoTermLoss([]))).toEqual(['too-few']);
    expect(codes(fitTwoTermLoss(points([[50, 1, 1.5], [50, 1.2, 2.1], [50, 1.4, 2.9]])))).toEqual(['one-frequency']);
    expect(codes(fitTwoTermLoss(points([[25, 1, 0.6], [50, 1, 1.5], [100, 1, 4.1]]), 'fit'))).toEqual(['one-flux']);
    expect(codes(fitTwoTermLoss(points([[25, 1, 0.6], [50, 1.2, 1.5]]), 'fit'))).toEqual(['too-few']);
    expect(codes(fitTwoTermLoss(points([[25, 0.5, 0.01], [50, 0.5, 0.02], [25, 1, 1], [50, 1, 2]]), 'fit'))).toEqual(['exponent-at-end']);
  });
  it('says when a part is below 0, when it is lost, and when frequencies lie too close for a split', () => {
    expect(codes(fitTwoTermLoss(points([[25, 1, 1.2], [50, 1, 1.5], [100, 1, 2]])))).toContain('negative');
    expect(codes(fitTwoTermLoss(points([[25, 1, 1], [50, 1, 2], [100, 1, 4]])))).toContain('not-from-zero');
    expect(codes(fitTwoTermLoss(points([[50, 1, 1.5], [52, 1, 1.58]])))).toContain('ill-conditioned');
    expect(codes(fitTwoTermLoss(points([[25, 1, 0.6], [100, 1, 3.8]])))).toEqual([]);
  });
  it('refuses readings that cannot be', () => {
    for (const bad of [0, -1, NaN, Infinity]) for (const at of [0, 1, 2]) {
      const row = [50, 1, 1.5];
      row[at] = bad;
      expect(() => fitTwoTermLoss(points([row, [25, 1, 0.6]]))).toThrow(OutOfRangeError);
      expect(() => fitThreeTermLoss(points([row, [25, 1, 0.6], [100, 1, 4]]))).toThrow(OutOfRangeError);
    }
    expect(() => fitTwoTermLoss(points([[50, 1, 1], [25, 1, 1]], 0))).toThrow(OutOfRangeError);
    expect(() => fitTwoTermLoss(strip, 0.9)).toThrow(OutOfRangeError);
    expect(() => fitThreeTermLoss(strip, NaN)).toThrow(OutOfRangeError);
  });
});

describe('Three parts after Bertotti', () => {
  // Source: pyleecan material file of M400-50A (Apache-2.0), 50 to 400 Hz; weighted fit computed, also with numpy.
  it.each([
    [1, [1.49, 4.15, 11.7, 35.9], 8.666e-3, 7.992e-5, 2.4387e-3, [0.433, 0.2, 0.862], 1.495],
    [1.5, [3.57, 9.82, 28.3, 91.7], 0.034513, 3.43e-4, 2.8284e-3, [1.726, 0.858, 1.0], 3.583],
  ])('M400-50A at %d T', (flux, losses, kh, kcl, kex, parts, total) => {
    const fit = fitted(fitThreeTermLoss(points([50, 100, 200, 400].map((f, i) => [f, flux, losses[i]!]))));
    // the published coefficients stand for that one flux: times its powers
    const [h, c, x] = [fit.hysteresis.value * flux ** 2, fit.eddy.value * flux ** 2, fit.excess.value * flux ** 1.5];
    expect(h).toBeCloseTo(kh, 6);
    expect(c).toBeCloseTo(kcl, 7);
    expect(x).toBeCloseTo(kex, 6);
    [h * 50, c * 2500, x * 50 ** 1.5].forEach((part, i) => expect(part).toBeCloseTo(parts[i]!, 3));
    expect(h * 50 + c * 2500 + x * 50 ** 1.5).toBeCloseTo(total, 3);
  });
  // Second implementation: numpy, u of 1 % each: 2.0625e-3, 1.478e-5, 3.711e-4; correlation −0.9867; condition number 36.4.
  it('says that the split is not unique, with the uncertainties a second implementation finds', () => {
    const fit = fitted(fitThreeTermLoss(points([[50, 1, 1.49], [100, 1, 4.15], [200, 1, 11.7], [400, 1, 35.9]])));
    expect(codes(fit)).toContain('ill-conditioned');
    expect(fit.conditionNumber).toBeCloseTo(36.388, 2);
    expect(fit.correlationWithExcess).toBeCloseTo(-0.98672, 4);
    expect(fit.correlation).toBeCloseTo(0.95285, 4);
    const spread = Math.max(1, Math.sqrt(fit.chiSquared));
    expect(fit.hysteresis.standardUncertainty / spread).toBeCloseTo(2.06249e-3, 7);
    expect(fit.eddy.standardUncertainty / spread).toBeCloseTo(1.47792e-5, 9);
    expect(fit.excess.standardUncertainty / spread).toBeCloseTo(3.7105e-4, 7);
  });
  it('a classical part far above the sheet’s own points to currents from sheet to sheet: here it lies below it', () => {
    const fit = fitted(fitThreeTermLoss(points([[50, 1, 1.49], [100, 1, 4.15], [200, 1, 11.7], [400, 1, 35.9]])));
    expect(fit.eddy.value).toBeLessThan(1.1686e-4); // computed for 0.50 mm of 46 µΩ·cm
  });
  it('names why it cannot tell', () => {
    expect(codes(fitThreeTermLoss(points([[25, 1, 0.6], [50, 1, 1.5]])))).toEqual(['too-few']);
    expect(codes(fitThreeTermLoss(points([[25, 1, 0.6], [50, 1, 1.5], [50, 1.2, 2.1]])))).toEqual(['too-few-frequencies']);
  });
});

describe('The straight fit underneath', () => {
  it('does not solve what has no answer', () => {
    expect(fitLinear([[1, 2], [2, 4]], [1, 2], [1, 1])).toBeUndefined();
    expect(fitLinear([[1, 0], [2, 0]], [1, 2], [1, 1])).toBeUndefined();
    expect(fitLinear([[1, 2]], [1], [1])).toBeUndefined();
    expect(fitLinear([], [], [])).toBeUndefined();
  });
  it('two columns at right angles have condition number 1', () => {
    const fit = fitLinear([[1, 1], [1, -1]], [3, 1], [1, 1])!;
    expect(fit.coefficients.map((c) => Math.round(c * 1e9) / 1e9)).toEqual([2, 1]);
    expect(fit.conditionNumber).toBeCloseTo(1, 9);
    expect(fit.chiSquared).toBeCloseTo(0, 12);
  });
});
