import { addDays } from './shop-date.js';

/** Before this, and so far ahead, no record of a shop lies; time zones of those days are no help. */
const FIRST = '1900-01-01';
const LAST = '9999-12-30';

/** Instant at which a calendar date of the shop begins, as records keep it; null beyond every record. */
export function dayStart(date: string, timeZone: string): string | null {
  if (date < FIRST) return `${FIRST}T00:00:00.000Z`;
  if (date > LAST) return null;
  const midnight = Date.parse(`${date}T00:00:00.000Z`);
  // twice: the offset at the first guess may be that of the other side of a clock change
  const guess = midnight - offsetMs(midnight, timeZone);
  return new Date(midnight - offsetMs(guess, timeZone)).toISOString();
}

/** Instant at which it has ended; null beyond every record. */
export const dayEnd = (date: string, timeZone: string): string | null => (date > LAST ? null : dayStart(addDays(date, 1), timeZone));

function offsetMs(at: number, timeZone: string): number {
  const parts = new Intl.DateTimeFormat('en-GB', { timeZone, hourCycle: 'h23', year: 'numeric', month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit', second: '2-digit' }).formatToParts(at);
  const of = (type: Intl.DateTimeFormatPartTypes) => parts.find((p) => p.type === type)!.value;
  const local = Date.parse(`${of('year').padStart(4, '0')}-${of('month')}-${of('day')}T${of('hour')}:${of('minute')}:${of('second')}Z`);
  return local - Math.floor(at / 1000) * 1000;
}
