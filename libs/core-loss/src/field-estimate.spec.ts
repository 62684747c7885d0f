import fc from 'fast-check';
import { OutOfRangeError } from '@libs/quantities';
import { describe, expect, it } from 'vitest';
import { FIELD_BAND, hRmsEstimate } from './field-estimate.js';

describe('The field a built core takes', () => {
  // Source: open dataset of a real stator stack (pfyhr/statordata, MIT), 20 to 400 Hz: the estimate rests on its 50 Hz readings,
  // the others are independent of it; crest factors of the same set give 194, 330, 768 and 1420 A/m.
  it.each([
    [1.0, 194], [1.3, 330], [1.5, 768], [1.6, 1420], [1.498869, 777], [1.316826, 345], [1.192322, 264], [0.5000606, 88.3], [1.301419, 331], [1.199028, 268], [1.000558, 200],
  ])('at %d T about %d A/m rms', (flux, field) => {
    expect(Math.abs(hRmsEstimate(flux) / field - 1)).toBeLessThan(0.05);
  });
  // Source: common practice, 6 to 12 rms ampere-turns per inch of mean path at 85 kilolines on normal motor steel.
  it('lies with its band over the rule of thumb of the trade', () => {
    const perInch = hRmsEstimate(1.3175) * 0.0254;
    expect(perInch).toBeGreaterThan(6);
    expect(perInch).toBeLessThan(12);
    expect(perInch * FIELD_BAND.low).toBeLessThan(7);
    expect(perInch * FIELD_BAND.high).toBeGreaterThan(12);
  });
  it('more flux always takes more field', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 1.59, noNaN: true }), fc.double({ min: 1e-6, max: 0.01, noNaN: true }), (flux, more) => {
        expect(hRmsEstimate(flux + more)).toBeGreaterThan(hRmsEstimate(flux));
      }),
    );
  });
  it('ends where it is worthless', () => {
    expect(hRmsEstimate(0.1)).toBeGreaterThan(0);
    expect(hRmsEstimate(1.6)).toBe(1420);
    for (const bad of [0.099, 1.601, 0, -1, NaN, Infinity]) expect(() => hRmsEstimate(bad)).toThrow(OutOfRangeError);
  });
});
