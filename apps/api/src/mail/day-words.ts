import { shopDate } from '../clock/shop-date.js';

const DAY = new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', day: 'numeric', month: 'long', year: 'numeric' });

/** A calendar day (yyyy-mm-dd) in words that no country reads the other way round: 4 March 2026. */
export const dayWords = (day: string): string => DAY.format(new Date(`${day}T00:00:00Z`));

/** An instant as the shop's clock showed it: 4 March 2026, 10:55. */
export function momentWords(instant: string, timeZone: string): string {
  const at = new Date(instant);
  const time = new Intl.DateTimeFormat('en-GB', { timeZone, hourCycle: 'h23', hour: '2-digit', minute: '2-digit' }).format(at);
  return `${dayWords(shopDate(at, timeZone))}, ${time}`;
}
