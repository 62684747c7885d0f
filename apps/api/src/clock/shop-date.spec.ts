import { describe, expect, it } from 'vitest';
import { addDays, daysApart, shopDate, shopYear } from './shop-date.js';

describe('the calendar of the shop', () => {
  it('the year of a number turns at midnight in the shop, not in Greenwich', () => {
    const lateOnNewYearsEve = new Date('2026-12-31T23:30:00.000Z');
    expect(shopYear(lateOnNewYearsEve, 'Europe/Berlin')).toBe(2027);
    expect(shopYear(lateOnNewYearsEve, 'America/Chicago')).toBe(2026);
  });
  it('a day stays a day through the nights when clocks change', () => {
    expect(shopDate(new Date('2026-03-29T00:30:00.000Z'), 'Europe/Berlin')).toBe('2026-03-29');
    expect(addDays('2026-03-28', 2)).toBe('2026-03-30');
    expect(addDays('2026-10-24', 2)).toBe('2026-10-26');
  });
  it('thirty days after the end of January are the second of March, in a leap year the first', () => {
    expect(addDays('2026-01-31', 30)).toBe('2026-03-02');
    expect(addDays('2028-01-31', 30)).toBe('2028-03-01');
  });
  it('days between two dates are counted on the calendar, backwards too', () => {
    expect(daysApart('2026-03-28', '2026-03-30')).toBe(2);
    expect(daysApart('2026-03-02', '2026-02-24')).toBe(-6);
  });
});
