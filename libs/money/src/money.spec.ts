import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { currencyDigits, formatMoney, lineAmounts, MoneyError, parseMoney, totals } from './index.js';

describe('a line of a quote', () => {
  it('costs quantity times price: 12 hours at 85.00 are 1020.00, with 19 % tax of 193.80', () => {
    expect(lineAmounts({ quantityThousandths: 12_000, unitPriceMinor: 8500, taxRateBasisPoints: 1900 })).toEqual({ netMinor: 102_000, taxMinor: 19_380 });
  });
  // worked by hand: 0.5 × 0.01 = 0.005, and 0.5 × 0.03 = 0.015
  it('rounds half a cent away from zero, up for a price and down for a discount', () => {
    expect(lineAmounts({ quantityThousandths: 500, unitPriceMinor: 1, taxRateBasisPoints: 0 }).netMinor).toBe(1);
    expect(lineAmounts({ quantityThousandths: 500, unitPriceMinor: 3, taxRateBasisPoints: 0 }).netMinor).toBe(2);
    expect(lineAmounts({ quantityThousandths: 500, unitPriceMinor: -1, taxRateBasisPoints: 0 }).netMinor).toBe(-1);
  });
  // worked by hand: 19 % of 0.50 is 0.095; 7 % of 0.50 is 0.035; 19 % of 0.47 is 0.0893
  it('rounds tax at the half cent away from zero', () => {
    expect(lineAmounts({ quantityThousandths: 1000, unitPriceMinor: 50, taxRateBasisPoints: 1900 }).taxMinor).toBe(10);
    expect(lineAmounts({ quantityThousandths: 1000, unitPriceMinor: 50, taxRateBasisPoints: 700 }).taxMinor).toBe(4);
    expect(lineAmounts({ quantityThousandths: 1000, unitPriceMinor: 47, taxRateBasisPoints: 1900 }).taxMinor).toBe(9);
  });
  it('knows that a dime and two dimes are three dimes', () => {
    expect(totals([10, 20].map((unitPriceMinor) => ({ quantityThousandths: 1000, unitPriceMinor, taxRateBasisPoints: 0 }))).netMinor).toBe(30);
  });
  it.each([
    ['a quantity of NaN', { quantityThousandths: Number.NaN }],
    ['a negative quantity', { quantityThousandths: -1 }],
    ['half a thousandth', { quantityThousandths: 0.5 }],
    ['a price of half a cent', { unitPriceMinor: 0.5 }],
    ['an infinite price', { unitPriceMinor: Number.POSITIVE_INFINITY }],
    ['a price beyond exact reckoning', { unitPriceMinor: 2 ** 53 }],
    ['a tax rate above 100 %', { taxRateBasisPoints: 10_001 }],
    ['a negative tax rate', { taxRateBasisPoints: -1 }],
  ])('refuses %s', (_, change) => {
    expect(() => lineAmounts({ quantityThousandths: 1000, unitPriceMinor: 100, taxRateBasisPoints: 1900, ...change })).toThrow(MoneyError);
  });
  it('refuses an amount that can no longer be reckoned exactly instead of rounding it', () => {
    expect(() => lineAmounts({ quantityThousandths: 1_000_000_000, unitPriceMinor: 99_999_999_999, taxRateBasisPoints: 0 })).toThrow(MoneyError);
  });
  it('treats negative zero as zero', () => {
    expect(Object.is(lineAmounts({ quantityThousandths: 0, unitPriceMinor: -0, taxRateBasisPoints: 0 }).netMinor, 0)).toBe(true);
  });
});

describe('the sums of a quote', () => {
  const line = fc.record({ quantityThousandths: fc.integer({ min: 0, max: 1_000_000 }), unitPriceMinor: fc.integer({ min: -1_000_000, max: 1_000_000 }), taxRateBasisPoints: fc.constantFrom(0, 700, 1900) });
  it('are exactly what stands on the lines, whatever the lines are', () => {
    fc.assert(
      fc.property(fc.array(line, { maxLength: 40 }), (lines) => {
        const t = totals(lines);
        const add = (pick: (l: { netMinor: number; taxMinor: number }) => number) => t.lines.reduce((a, l) => a + pick(l), 0);
        expect(t.netMinor).toBe(add((l) => l.netMinor));
        expect(t.taxMinor).toBe(add((l) => l.taxMinor));
        expect(t.grossMinor).toBe(t.netMinor + t.taxMinor);
        expect(t.taxSummary.reduce((a, s) => a + s.taxMinor, 0)).toBe(t.taxMinor);
      }),
    );
  });
  it('do not depend on the order of the lines', () => {
    fc.assert(
      fc.property(fc.array(line, { maxLength: 20 }), (lines) => {
        expect(totals([...lines].reverse()).grossMinor).toBe(totals(lines).grossMinor);
      }),
    );
  });
  it('list each tax rate once, the lowest first', () => {
    const t = totals([1900, 700, 1900].map((taxRateBasisPoints) => ({ quantityThousandths: 1000, unitPriceMinor: 100, taxRateBasisPoints })));
    expect(t.taxSummary).toEqual([
      { taxRateBasisPoints: 700, netMinor: 100, taxMinor: 7 },
      { taxRateBasisPoints: 1900, netMinor: 200, taxMinor: 38 },
    ]);
  });
  it('of no lines are nothing', () => {
    expect(totals([])).toEqual({ lines: [], taxSummary: [], netMinor: 0, taxMinor: 0, grossMinor: 0 });
  });
});

describe('writing and reading money', () => {
  // ISO 4217: the yen has no minor unit, the dinar of Bahrain three decimals
  it('knows currencies with no, two and three decimals', () => {
    expect(['JPY', 'EUR', 'USD', 'BHD'].map(currencyDigits)).toEqual([0, 2, 2, 3]);
    expect([formatMoney(500, 'JPY'), formatMoney(123_450, 'EUR'), formatMoney(5120, 'BHD')]).toEqual(['500', '1\u202f234.50', '5.120']);
  });
  it('writes less than one, and less than nothing', () => {
    expect([formatMoney(5, 'EUR'), formatMoney(-5, 'EUR'), formatMoney(0, 'EUR'), formatMoney(-123_456_789, 'EUR')]).toEqual(['0.05', '−0.05', '0.00', '−1\u202f234\u202f567.89']);
  });
  it('reads back what it writes, in every currency', () => {
    fc.assert(
      fc.property(fc.integer({ min: -(10 ** 12), max: 10 ** 12 }), fc.constantFrom('JPY', 'EUR', 'BHD'), (amount, currency) => {
        expect(parseMoney(formatMoney(amount, currency), currency)).toEqual({ ok: true, amountMinor: amount });
        expect(parseMoney(`${formatMoney(amount, currency, { group: '.', decimal: ',' })} ${currency}`, currency)).toEqual({ ok: true, amountMinor: amount });
      }),
    );
  });
  it.each([
    ['12,5', 1250],
    ['12.50', 1250],
    ['1.234,5', 123_450],
    ['1,234.5', 123_450],
    ['1 234,50 EUR', 123_450],
    ['EUR 7', 700],
    ['1.234.567', 123_456_700],
    ['-3', -300],
  ])('reads %s euros', (text, amountMinor) => expect(parseMoney(text, 'EUR')).toEqual({ ok: true, amountMinor }));
  it.each([
    ['', 'empty'],
    ['twelve', 'not-a-number'],
    ['1,2,3', 'ambiguous'],
    ['1.234', 'ambiguous'],
    ['0,125', 'too-many-decimals'],
    ['1.23.456', 'ambiguous'],
    ['1e5', 'not-a-number'],
    ['99999999999999999', 'too-large'],
  ])('does not guess at “%s”', (text, code) => expect(parseMoney(text, 'EUR')).toMatchObject({ ok: false, code }));
  it('reads three decimals where the currency has them', () => {
    expect(parseMoney('1.234', 'BHD')).toEqual({ ok: true, amountMinor: 1234 });
    expect(parseMoney('1.234', 'JPY')).toEqual({ ok: true, amountMinor: 1234 });
  });
  it('refuses a currency that is none', () => {
    expect(() => currencyDigits('euro')).toThrow(MoneyError);
  });
});
