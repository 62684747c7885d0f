/** In which order a date names day, month and year. */
export type DateOrder = 'ymd' | 'dmy' | 'mdy';

const DAY_S = 86_400;
const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const YEAR_FIRST = /^(\d{4})([-/.])(\d{1,2})\2(\d{1,2})$/;
const YEAR_LAST = /^(\d{1,2})([-/.])(\d{1,2})\2(\d{4}|\d{2})$/;
const NAMED_MONTH = /^(\d{1,2})[-/. ]([A-Za-z]{3})[a-z]*\.?[-/. ](\d{4}|\d{2})$/;
const CLOCK = /^(\d{1,4}):(\d{2})(?::(\d{2})(?:[.,](\d{1,9}))?)?(?: ?([AaPp])\.?[Mm]\.?)?(Z|[+-]\d{2}:?\d{2})?$/;
const STAMP = /^(.{6,12}?)(?:[T ,]\s*|\s+)(\d{1,2}:\d{2}.*)$/;

/** Days from 1970-01-01 to a day of the Gregorian calendar. */
function daysSince1970(year: number, month: number, day: number): number | null {
  if (month < 1 || month > 12 || day < 1 || day > daysIn(year, month)) return null;
  return Date.UTC(year, month - 1, day) / (1000 * DAY_S);
}
const daysIn = (year: number, month: number) => new Date(Date.UTC(year, month, 0)).getUTCDate();
const fourDigits = (year: string) => (year.length === 4 ? Number(year) : 2000 + Number(year));

/**
 * The day a cell names, in days since 1970-01-01. Two-figure years are of this century.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `cell` | text | `2026-03-09`, `09.03.2026`, `3/9/26`, `9-Mar-2026` |
 * | – | `order` | – | how a date with the year last is read |
 *
 * @returns null where the cell names no day of the calendar in that order
 *
 * Source: Gregorian calendar.
 * @example
 * readDay('09.03.2026', 'dmy') - readDay('2026-03-01', 'dmy')
 * // → 8
 */
export function readDay(cell: string, order: DateOrder): number | null {
  const first = YEAR_FIRST.exec(cell);
  if (first) return daysSince1970(Number(first[1]), Number(first[3]), Number(first[4]));
  const last = YEAR_LAST.exec(cell);
  if (last) {
    const [a, b] = [Number(last[1]), Number(last[3])];
    return order === 'mdy' ? daysSince1970(fourDigits(last[4]!), a, b) : daysSince1970(fourDigits(last[4]!), b, a);
  }
  const named = NAMED_MONTH.exec(cell);
  const month = named ? MONTHS.indexOf(named[2]!.toLowerCase()) + 1 : 0;
  return named && month > 0 ? daysSince1970(fourDigits(named[3]!), month, Number(named[1])) : null;
}

/**
 * Seconds on a clock, or run since the start: `14:05`, `2:05:30 PM`, `26:10:00,250`. An offset from universal time is taken off.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `cell` | text | hours, minutes, and seconds where there are any |
 *
 * @returns null where the cell is no clock
 *
 * Source: ISO 8601 for the 24 hour clock and the offset. Standing: from memory.
 * @example
 * readClock('2:05:30 PM')
 * // → 50730
 */
export function readClock(cell: string): number | null {
  const parts = CLOCK.exec(cell);
  if (!parts) return null;
  const [, h, m, s = '0', fraction, half, zone] = parts;
  const minutes = Number(m);
  const seconds = Number(s);
  let hours = Number(h);
  if (minutes > 59 || seconds > 60) return null;
  if (half !== undefined) {
    if (hours < 1 || hours > 12) return null;
    hours = (hours % 12) + (half.toLowerCase() === 'p' ? 12 : 0);
  }
  return hours * 3600 + minutes * 60 + seconds + (fraction === undefined ? 0 : Number(`0.${fraction}`)) - offsetOf(zone);
}

function offsetOf(zone: string | undefined): number {
  if (zone === undefined || zone === 'Z') return 0;
  const size = Number(zone.slice(1, 3)) * 3600 + Number(zone.slice(-2)) * 60;
  return zone.startsWith('-') ? -size : size;
}

/**
 * Day and clock in one cell, in seconds since 1970-01-01 on the clock the file was written by.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `cell` | text | a day as `readDay`, a clock as `readClock`, with `T`, blank or comma between |
 * | – | `order` | – | as `readDay` |
 *
 * @returns null where the cell is none
 *
 * Source: as `readDay` and `readClock`.
 * @example
 * readStamp('2026-03-09T06:00:30', 'ymd') - readStamp('09.03.2026 06:00:00', 'dmy')
 * // → 30
 */
export function readStamp(cell: string, order: DateOrder): number | null {
  const parts = STAMP.exec(cell);
  if (!parts) return null;
  const day = readDay(parts[1]!, order);
  const clock = day === null ? null : readClock(parts[2]!);
  return day === null || clock === null || clock > DAY_S + DAY_S / 2 ? null : day * DAY_S + clock;
}
