const MONTHS = ['January', 'February', 'March', 'April', 'May', 'June', 'July', 'August', 'September', 'October', 'November', 'December'];

/**
 * A calendar day in words that no country reads the other way round.
 *
 * @returns '4 March 2026', or the text as it came where it is not a day.
 *
 * @example
 * dayWords('2026-03-04').length
 * // → 12
 */
export function dayWords(day: string): string {
  const [, year, month, date] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(day) ?? [];
  const name = MONTHS[Number(month) - 1];
  return name ? `${Number(date)}\u00a0${name} ${year}` : day;
}

/** Money by transfer is known to the day, not to the minute. */
const DAY_ALONE = /^\d{4}-\d{2}-\d{2}$/;

/** An instant as the shop's clock showed it; the calendar day alone where only that counts. */
export function momentWords(instant: string, timeZone: string): string {
  if (DAY_ALONE.test(instant)) return dayWords(instant);
  const { day, time } = local(instant, timeZone);
  return time ? `${dayWords(day)}, ${time}` : day;
}

export function dayOf(instant: string, timeZone: string): string {
  return dayWords(local(instant, timeZone).day);
}

function local(instant: string, timeZone: string): { day: string; time: string } {
  const date = new Date(instant);
  if (Number.isNaN(date.getTime())) return { day: instant, time: '' };
  const parts = clockOf(timeZone).formatToParts(date);
  const part = (type: string) => parts.find((p) => p.type === type)?.value ?? '';
  return { day: `${part('year').padStart(4, '0')}-${part('month')}-${part('day')}`, time: `${part('hour')}:${part('minute')}` };
}

const clocks = new Map<string, Intl.DateTimeFormat>();
function clockOf(timeZone: string): Intl.DateTimeFormat {
  const known = clocks.get(timeZone);
  if (known) return known;
  const clock = new Intl.DateTimeFormat('en-GB', { timeZone, hourCycle: 'h23', year: 'numeric', month: '2-digit', day: '2-digit', hour: '2-digit', minute: '2-digit' });
  clocks.set(timeZone, clock);
  return clock;
}
