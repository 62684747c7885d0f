import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MoneyError, allocate, discounted, formatMoney, lineAmounts } from './index.js';

const amount = fc.integer({ min: -99_999_999_999, max: 99_999_999_999 });
const sum = (shares: readonly number[]) => shares.reduce((a, s) => a + s, 0);

describe('a discount', () => {
  // worked by hand: 10 % of 0.05 is half a cent; 50 % of 0.01 is half a cent; 3 % of 33.50 is 1.005
  it.each([
    [5, 1000, 1, 4],
    [1, 5000, 1, 0],
    [3350, 300, 101, 3249],
    [-5, 1000, -1, -4],
    [1020, 0, 0, 1020],
    [1020, 10_000, 1020, 0],
  ])('on %i at %i hundredths of a percent takes off %i and leaves %i', (amountMinor, rate, discountMinor, netMinor) => {
    expect(discounted(amountMinor, rate)).toEqual({ discountMinor, netMinor });
  });
  it('and what is left are always the amount again, and nobody pays more for it', () => {
    fc.assert(
      fc.property(amount, fc.integer({ min: 0, max: 10_000 }), (amountMinor, rate) => {
        const { discountMinor, netMinor } = discounted(amountMinor, rate);
        expect(discountMinor + netMinor === amountMinor).toBe(true);
        expect(Math.abs(netMinor)).toBeLessThanOrEqual(Math.abs(amountMinor));
      }),
    );
  });
  it.each([
    ['of NaN', 100, Number.NaN],
    ['below zero', 100, -1],
    ['above 100 %', 100, 10_001],
    ['of half a basis point', 100, 0.5],
    ['on half a cent', 0.5, 100],
    ['on ten cents and twenty cents added as fractions', 0.1 + 0.2, 100],
    ['on more than can be reckoned exactly', 2 ** 53, 100],
  ])('%s is refused', (_, amountMinor, rate) => expect(() => discounted(amountMinor, rate)).toThrow(MoneyError));
});

describe('sharing out an amount', () => {
  // worked by hand
  it.each([
    [100, [1, 1, 1], [34, 33, 33]],
    [-100, [1, 1, 1], [-34, -33, -33]],
    [5, [3, 7], [2, 3]],
    [1, [0, 1, 1], [0, 1, 0]],
    [0, [1, 2], [0, 0]],
    [7, [10], [7]],
    [101, [50, 50, 0], [51, 50, 0]],
  ])('%i by %j gives %j', (amountMinor, weights, shares) => expect(allocate(amountMinor, weights)).toEqual(shares));
  const weights = fc.array(fc.integer({ min: 0, max: 1_000_000 }), { minLength: 1, maxLength: 30 }).filter((w) => sum(w) > 0);
  it('loses no cent, and gives nobody a whole cent more or less than is due', () => {
    fc.assert(
      fc.property(amount, weights, (amountMinor, w) => {
        const shares = allocate(amountMinor, w);
        expect(sum(shares) === amountMinor).toBe(true);
        const all = BigInt(sum(w));
        shares.forEach((share, i) => {
          const off = BigInt(share) * all - BigInt(amountMinor) * BigInt(w[i]!);
          expect((off < 0n ? -off : off) < all).toBe(true);
          if (w[i] === 0) expect(share).toBe(0);
        });
      }),
    );
  });
  it('gives the same whether the weights are counted in ones or in thousands', () => {
    fc.assert(fc.property(amount, weights, (amountMinor, w) => void expect(allocate(amountMinor, w.map((x) => x * 1000))).toEqual(allocate(amountMinor, w))));
  });
  it.each([
    ['nobody', 100, []],
    ['nobody who counts', 100, [0, 0]],
    ['a negative weight', 100, [1, -1]],
    ['half a weight', 100, [0.5]],
    ['NaN', Number.NaN, [1]],
    ['NaN as a weight', 100, [Number.NaN]],
  ])('to %s is refused', (_, amountMinor, w) => expect(() => allocate(amountMinor, w)).toThrow(MoneyError));
  it('never gives negative zero', () => expect(allocate(-1, [1, 1]).every((s) => !Object.is(s, -0))).toBe(true));
});

describe('money beside binary fractions', () => {
  it.each([0.1 + 0.2, Number.NaN, Number.POSITIVE_INFINITY, 2 ** 53])('%d is no amount to print', (amountMinor) => expect(() => formatMoney(amountMinor, 'EUR')).toThrow(MoneyError));
  it('negative zero is printed as zero', () => expect(formatMoney(-0, 'EUR')).toBe('0.00'));
  // 1.005 × 100 is 100.49999 in binary: 1.005 of a unit at 1.00 is 1.005, half a cent, so 1.01
  it('1.005 of a unit at 1.00 costs 1.01', () => expect(lineAmounts({ quantityThousandths: 1005, unitPriceMinor: 100, taxRateBasisPoints: 0 }).netMinor).toBe(101));
  it('the largest amounts still come out to the cent', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 1000 }), fc.integer({ min: 0, max: 9_000_000_000_000 }), (units, unitPriceMinor) => {
        const { netMinor } = lineAmounts({ quantityThousandths: units * 1000, unitPriceMinor, taxRateBasisPoints: 0 });
        expect(BigInt(netMinor)).toBe(BigInt(units) * BigInt(unitPriceMinor));
      }),
    );
  });
});
