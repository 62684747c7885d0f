import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readClock, readDay, readStamp } from './time-cell.js';

const seconds = (iso: string) => Date.parse(`${iso}Z`) / 1000;

describe('A time in a cell', () => {
  it.each([
    ['2026-03-09T06:00:30', 'ymd', '2026-03-09T06:00:30'],
    ['2026-03-09 06:00', 'ymd', '2026-03-09T06:00:00'],
    ['2026/03/09 6:00:30', 'ymd', '2026-03-09T06:00:30'],
    ['09.03.2026 06:00:30', 'dmy', '2026-03-09T06:00:30'],
    ['9.3.26 6:00:30', 'dmy', '2026-03-09T06:00:30'],
    ['03/09/2026 06:00:30', 'mdy', '2026-03-09T06:00:30'],
    ['09/03/2026, 06:00:30', 'dmy', '2026-03-09T06:00:30'],
    ['03/09/2026 6:00:30 PM', 'mdy', '2026-03-09T18:00:30'],
    ['03/09/2026 12:00:30 am', 'mdy', '2026-03-09T00:00:30'],
    ['9-Mar-2026 06:00:30', 'dmy', '2026-03-09T06:00:30'],
    ['2026-03-09T06:00:30.250Z', 'ymd', '2026-03-09T06:00:30.250'],
    ['2026-03-09 06:00:30,5', 'ymd', '2026-03-09T06:00:30.500'],
    ['2026-03-09T06:00:30+01:00', 'ymd', '2026-03-09T05:00:30'],
    ['2026-03-09T06:00:30-0530', 'ymd', '2026-03-09T11:30:30'],
    ['2024-02-29 00:00', 'ymd', '2024-02-29T00:00:00'],
  ] as const)('%s (%s)', (cell, order, iso) => {
    expect(readStamp(cell, order)).toBeCloseTo(seconds(iso), 6);
  });
  it.each(['', '351.2', '2026-02-30 06:00', '31.02.2026 06:00', '13/13/2026 06:00', '2026-03-09', '06:00:30', '2026-03-09 6h', '2026-03-09 06:75', '03/09/2026 13:00 PM', 'Time', '9-Foo-2026 06:00', '2026-03-09 99:00'])('%s is no time of a day', (cell) => {
    expect(readStamp(cell, 'dmy')).toBeNull();
  });
  it('a day is a day of the calendar', () => {
    expect(readDay('31.12.1999', 'dmy')).toBe(readDay('2000-01-01', 'ymd')! - 1);
    expect(readDay('29.02.2025', 'dmy')).toBeNull();
    expect(readDay('12/31/2025', 'dmy')).toBeNull();
  });
  it('a clock may run past 24 hours', () => {
    expect(readClock('26:10:00')).toBe(26 * 3600 + 600);
    expect(readClock('0:05')).toBe(300);
    expect(readClock('5')).toBeNull();
  });
  it('is read back as it was written', () => {
    fc.assert(
      fc.property(fc.date({ min: new Date('2000-01-01'), max: new Date('2099-12-31'), noInvalidDate: true }), (date) => {
        const iso = date.toISOString();
        expect(readStamp(iso, 'ymd')).toBeCloseTo(date.getTime() / 1000, 2);
        const [, y, m, d, rest] = /^(....)-(..)-(..)T(........)/.exec(iso)!;
        expect(readStamp(`${d}.${m}.${y} ${rest}`, 'dmy')).toBe(Math.floor(date.getTime() / 1000));
        expect(readStamp(`${m}/${d}/${y} ${rest}`, 'mdy')).toBe(Math.floor(date.getTime() / 1000));
      }),
    );
  });
});
