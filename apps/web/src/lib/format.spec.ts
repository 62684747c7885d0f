import { afterEach, describe, expect, it } from 'vitest';
import { calendarDay, dayOf, daysBetween, momentOf, moneyOf, setShopZone, shopToday, sizeOf } from './format.js';

afterEach(() => setShopZone('UTC'));

describe('dates and amounts on screen', () => {
  it('shows an instant in the shop’s zone, through the change of the clocks', () => {
    setShopZone('Europe/Berlin');
    expect(momentOf('2026-03-29T00:30:00.000Z')).toBe('29 Mar 2026, 01:30');
    expect(momentOf('2026-03-29T01:30:00.000Z')).toBe('29 Mar 2026, 03:30');
    setShopZone('America/Chicago');
    expect(dayOf('2026-03-01T02:00:00.000Z')).toBe('28 Feb 2026');
  });

  it('never shifts a calendar date, in whatever zone the shop is', () => {
    for (const zone of ['Pacific/Auckland', 'UTC', 'America/Los_Angeles']) {
      setShopZone(zone);
      expect(calendarDay('2026-12-01')).toBe('1 Dec 2026');
    }
  });

  it('knows today in the shop, not on the tablet', () => {
    setShopZone('Pacific/Auckland');
    expect(shopToday(new Date('2026-12-01T12:00:00Z'))).toBe('2026-12-02');
  });

  it('counts whole days between dates across a change of the clocks', () => {
    expect(daysBetween('2026-03-28', '2026-03-30')).toBe(2);
    expect(daysBetween('2026-03-30', '2026-03-28')).toBe(-2);
  });

  it('writes amounts with their currency and its decimals', () => {
    expect(moneyOf(123450, 'EUR').replace(/\s/g, ' ')).toBe('1 234.50 EUR');
    expect(moneyOf(500, 'JPY').replace(/\s/g, ' ')).toBe('500 JPY');
  });

  it('writes the size of a file', () => {
    expect(sizeOf(200).replace(/\s/g, ' ')).toBe('1 kB');
    expect(sizeOf(2_400_000).replace(/\s/g, ' ')).toBe('2.4 MB');
  });
});
