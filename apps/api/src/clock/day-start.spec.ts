import { describe, expect, it } from 'vitest';
import { dayEnd, dayStart } from './day-start.js';

describe('the instant at which a day of the shop begins', () => {
  it.each([
    ['2026-01-15', 'Europe/Berlin', '2026-01-14T23:00:00.000Z'],
    ['2026-07-15', 'Europe/Berlin', '2026-07-14T22:00:00.000Z'],
    // summer time begins on 29 March 2026 and ends on 25 October 2026, by Directive 2000/84/EC the last Sundays of both months
    ['2026-03-29', 'Europe/Berlin', '2026-03-28T23:00:00.000Z'],
    ['2026-03-30', 'Europe/Berlin', '2026-03-29T22:00:00.000Z'],
    ['2026-10-25', 'Europe/Berlin', '2026-10-24T22:00:00.000Z'],
    ['2026-10-26', 'Europe/Berlin', '2026-10-25T23:00:00.000Z'],
    ['2026-01-15', 'America/Chicago', '2026-01-15T06:00:00.000Z'],
    ['2026-01-15', 'Asia/Kolkata', '2026-01-14T18:30:00.000Z'],
    ['2026-01-15', 'UTC', '2026-01-15T00:00:00.000Z'],
  ])('%s in %s is %s', (date, zone, instant) => {
    expect(dayStart(date, zone)).toBe(instant);
  });
  it('of a day before every record is the beginning, and beyond every record there is none', () => {
    expect(dayStart('0001-01-01', 'Europe/Berlin')).toBe('1900-01-01T00:00:00.000Z');
    expect(dayStart('9999-12-31', 'Europe/Berlin')).toBeNull();
    expect(dayEnd('9999-12-31', 'Europe/Berlin')).toBeNull();
  });
  it('a day ends when the next one begins, also on the day that has 25 hours', () => {
    expect(dayEnd('2026-10-25', 'Europe/Berlin')).toBe('2026-10-25T23:00:00.000Z');
    expect(dayEnd('2026-12-31', 'UTC')).toBe('2027-01-01T00:00:00.000Z');
  });
});
