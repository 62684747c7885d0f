import { describe, expect, it } from 'vitest';
import { dayOf, dayWords, momentWords } from './dates.js';

describe('dates on papers', () => {
  it('writes the month as a word, so that no country reads the day as the month', () => {
    expect(dayWords('2026-03-04')).toBe('4\u00a0March 2026');
  });

  it('shows an instant on the shop’s clock, in summer and in winter', () => {
    expect(momentWords('2026-07-01T22:30:00.000Z', 'Europe/Berlin')).toBe('2\u00a0July 2026, 00:30');
    expect(momentWords('2026-12-31T23:30:00.000Z', 'Europe/Berlin')).toBe('1\u00a0January 2027, 00:30');
    expect(dayOf('2026-12-31T23:30:00.000Z', 'America/New_York')).toBe('31\u00a0December 2026');
  });

  it('a day alone gets no time of day that nobody wrote down', () => {
    expect(momentWords('2026-03-04', 'Europe/Berlin')).toBe('4\u00a0March 2026');
    expect(momentWords('2026-03-04', 'America/New_York')).toBe('4\u00a0March 2026');
  });

  it('prints what it was given where that is no date', () => {
    expect(dayWords('soon')).toBe('soon');
    expect(momentWords('soon', 'UTC')).toBe('soon');
  });
});
