import { formatMoney } from '@libs/money';

let zone = 'UTC';
/** Dates are shown in the shop's time zone, wherever the screen stands. */
export function setShopZone(timeZone: string): void {
  zone = timeZone;
}

const instant = (options: Intl.DateTimeFormatOptions) => (iso: string) => new Intl.DateTimeFormat('en-GB', { timeZone: zone, ...options }).format(new Date(iso));
export const dayOf = instant({ day: 'numeric', month: 'short', year: 'numeric' });
export const momentOf = instant({ day: 'numeric', month: 'short', year: 'numeric', hour: '2-digit', minute: '2-digit' });

/** A calendar date as it is, without any zone. */
export function calendarDay(date: string): string {
  const [year, month, day] = date.split('-').map(Number) as [number, number, number];
  return new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', day: 'numeric', month: 'short', year: 'numeric' }).format(new Date(Date.UTC(year, month - 1, day)));
}

/** Today in the shop's zone, as yyyy-mm-dd. */
export const shopToday = (now: Date): string => new Intl.DateTimeFormat('en-CA', { timeZone: zone, year: 'numeric', month: '2-digit', day: '2-digit' }).format(now);

export const moneyOf = (minor: number, currency: string): string => `${formatMoney(minor, currency)} ${currency}`;
export const sizeOf = (bytes: number): string => (bytes < 1_000_000 ? `${Math.max(1, Math.round(bytes / 1000))} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`);
