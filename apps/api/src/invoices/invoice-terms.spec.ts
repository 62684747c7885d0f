import { describe, expect, it } from 'vitest';
import { dueDate, termsWords } from './invoice-terms.js';

describe('the terms of an invoice', () => {
  it('thirty days net from the end of January end in March', () => {
    expect(dueDate('2026-01-31', { terms: 'account', netDays: 30 })).toBe('2026-03-02');
    expect(dueDate('2028-01-31', { terms: 'account', netDays: 30 })).toBe('2028-03-01');
  });

  it('a prepayment customer pays at once, whatever days are written', () => {
    expect(dueDate('2026-01-31', { terms: 'prepayment', netDays: 30 })).toBe('2026-01-31');
    expect(termsWords({ terms: 'prepayment', netDays: 30 })).toBe('Payable before collection');
  });

  it('are written as the trade says them', () => {
    expect([0, 1, 14].map((netDays) => termsWords({ terms: 'account', netDays }))).toEqual(['Due at once', '1 day net', '14 days net']);
  });
});
