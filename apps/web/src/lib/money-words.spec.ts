import { beforeAll, describe, expect, it } from 'vitest';
import { setShopZone } from './format.js';
import { quantityText, quantityWords, rateText, receivedWords } from './money-words.js';

beforeAll(() => setShopZone('Europe/Berlin'));

describe('figures of a quote or an invoice in words', () => {
  it('writes no more decimals than there are', () => {
    expect([1000, 1500, 24_900, 125, 10_000_000].map(quantityText)).toEqual(['1', '1.5', '24.9', '0.125', '10000']);
    expect([1900, 750, 0, 1].map(rateText)).toEqual(['19', '7.5', '0', '0.01']);
  });

  it('leaves the unit away where there is none', () => {
    expect(quantityWords({ quantityThousandths: 6000, unit: 'h' })).toBe('6\u00a0h');
    expect(quantityWords({ quantityThousandths: 1000, unit: '' })).toBe('1');
  });

  it('gives a transfer its day alone, and a card payment its minute', () => {
    expect(receivedWords('2026-11-29')).toBe('29 Nov 2026');
    expect(receivedWords('2026-12-01T14:07:00.000Z')).toBe('1 Dec 2026, 15:07');
  });
});
