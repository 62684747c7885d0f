import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { EXTRA_LOSS_CAUTION, USUAL_CORE_SHARE, assumedCoreLossW, efficiencyWithExtraLoss, extraLossPerYear } from './extra-loss.js';

describe('What a risen core loss means for the machine (computed)', () => {
  it('15 kW of 92.1 %: 1286.6 W are lost, 257.3 W of them in the core; +20 % is 51.5 W and 91.81 %', () => {
    expect(15000 * (1 / 0.921 - 1)).toBeCloseTo(1286.6, 1);
    const core = assumedCoreLossW(15000, 0.921);
    expect(core).toBeCloseTo(257.3, 1);
    expect(0.2 * core).toBeCloseTo(51.5, 1);
    expect(efficiencyWithExtraLoss(15000, 0.921, 0.2 * core)).toBeCloseTo(0.9181, 4);
    expect(efficiencyWithExtraLoss(15000, 0.921, core)).toBeCloseTo(0.9067, 4);
  });
  it('100 hp of 95.4 %: 3597 W; +20 % of a fifth is 143.9 W, 95.22 %, 1151 kWh in 8000 hours, 115 at 0.10', () => {
    expect(74600 * (1 / 0.954 - 1)).toBeCloseTo(3597, 0);
    const core = assumedCoreLossW(74600, 0.954);
    const year = extraLossPerYear({ increase: 0.2, expandedUncertainty: 0.024 }, { coreLossW: core, hoursPerYear: 8000, tariffMinorPerKWh: 10 });
    expect(year.extraWatts).toBeCloseTo(143.9, 1);
    expect(year.expandedUncertaintyW).toBeCloseTo(0.024 * core, 9);
    expect(year.kWhPerYear).toBeCloseTo(1151, 0);
    expect(year.amountMinorPerYear).toBe(11511);
    expect(efficiencyWithExtraLoss(74600, 0.954, year.extraWatts)).toBeCloseTo(0.9522, 4);
  });
  // Source: share of the core quoted in papers on motor losses, 15 to 25 %.
  it('the usual share of the core lies between 15 and 25 %', () => {
    expect(USUAL_CORE_SHARE.low).toBeLessThan(USUAL_CORE_SHARE.middle);
    expect(USUAL_CORE_SHARE.middle).toBeLessThan(USUAL_CORE_SHARE.high);
    expect(assumedCoreLossW(15000, 0.921, 0.25) / assumedCoreLossW(15000, 0.921, 0.15)).toBeCloseTo(5 / 3, 9);
  });
});

describe('Money and cautions', () => {
  const use = { coreLossW: 500, hoursPerYear: 4000 };
  it('without a tariff there is no amount, and never a 0 in its place', () => {
    expect(extraLossPerYear({ increase: 0.1, expandedUncertainty: 0 }, use)).not.toHaveProperty('amountMinorPerYear');
  });
  it('a fall saves: the figures are negative', () => {
    const year = extraLossPerYear({ increase: -0.04, expandedUncertainty: 0.02 }, { ...use, tariffMinorPerKWh: 12.5 });
    expect(year.kWhPerYear).toBeCloseTo(-80, 9);
    expect(year.amountMinorPerYear).toBe(-1000);
  });
  it('the amount is a whole number of minor units, whatever the tariff', () => {
    fc.assert(
      fc.property(fc.double({ min: -0.9, max: 3, noNaN: true }), fc.double({ min: 0, max: 100, noNaN: true }), (increase, tariffMinorPerKWh) => {
        const year = extraLossPerYear({ increase, expandedUncertainty: 0 }, { ...use, tariffMinorPerKWh });
        expect(Number.isInteger(year.amountMinorPerYear)).toBe(true);
        expect(Math.abs(year.amountMinorPerYear! - year.kWhPerYear * tariffMinorPerKWh)).toBeLessThanOrEqual(0.5);
      }),
    );
  });
  it('the caution says what a ring test is not', () => {
    expect(extraLossPerYear({ increase: 0.1, expandedUncertainty: 0 }, use).caution).toBe(EXTRA_LOSS_CAUTION);
    expect(EXTRA_LOSS_CAUTION).toMatch(/no efficiency test/);
    expect(EXTRA_LOSS_CAUTION).toMatch(/assumed/);
  });
});

describe('What cannot be is refused', () => {
  it('with the field', () => {
    for (const bad of [0, -1, NaN, Infinity]) expect(() => assumedCoreLossW(bad, 0.9)).toThrow(OutOfRangeError);
    for (const bad of [0, 1, 1.2, NaN]) {
      expect(() => assumedCoreLossW(1000, bad)).toThrow(OutOfRangeError);
      expect(() => efficiencyWithExtraLoss(1000, bad, 10)).toThrow(OutOfRangeError);
    }
    expect(() => assumedCoreLossW(1000, 0.9, 1.1)).toThrow(OutOfRangeError);
    expect(() => efficiencyWithExtraLoss(1000, 0.9, -112)).toThrow(OutOfRangeError);
    expect(() => efficiencyWithExtraLoss(1000, 0.9, NaN)).toThrow(OutOfRangeError);
    const use = { coreLossW: 500, hoursPerYear: 4000 };
    const change = { increase: 0.1, expandedUncertainty: 0.01 };
    expect(() => extraLossPerYear({ ...change, increase: NaN }, use)).toThrow(OutOfRangeError);
    expect(() => extraLossPerYear({ ...change, increase: -1 }, use)).toThrow(OutOfRangeError);
    expect(() => extraLossPerYear({ ...change, expandedUncertainty: -1 }, use)).toThrow(OutOfRangeError);
    expect(() => extraLossPerYear(change, { ...use, coreLossW: NaN })).toThrow(OutOfRangeError);
    expect(() => extraLossPerYear(change, { ...use, hoursPerYear: 8785 })).toThrow(OutOfRangeError);
    expect(() => extraLossPerYear(change, { ...use, tariffMinorPerKWh: -1 })).toThrow(OutOfRangeError);
  });
});
