import { describe, expect, it } from 'vitest';
import { fromServiceAmount, toServiceAmount } from './service-amount.js';

describe('amounts on their way to the payment service', () => {
  it('euro cents, whole yen and fils of Bahrain go as they are', () => {
    expect(toServiceAmount(119_000, 'EUR')).toBe(119_000);
    expect(toServiceAmount(500, 'JPY')).toBe(500);
    expect(toServiceAmount(5120, 'BHD')).toBe(5120);
  });

  it('a single fils cannot be moved by a bank', () => {
    expect(toServiceAmount(5125, 'BHD')).toBeNull();
  });

  it('Icelandic krona and Ugandan shilling are sent as hundredths and come back whole', () => {
    expect(toServiceAmount(500, 'ISK')).toBe(50_000);
    expect(fromServiceAmount(50_000, 'ISK')).toBe(500);
    expect(fromServiceAmount(50_050, 'ISK')).toBeNull();
    expect(toServiceAmount(500, 'UGX')).toBe(50_000);
  });

  it('nothing, less than nothing, and numbers that are none are not sent', () => {
    for (const amount of [0, -1, 0.5, Number.NaN, Number.POSITIVE_INFINITY, 2 ** 53]) expect(toServiceAmount(amount, 'EUR')).toBeNull();
  });
});
