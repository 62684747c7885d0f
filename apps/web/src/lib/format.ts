import { formatMoney } from '@libs/money';

let zone = 'UTC';
let formats = new Map<string, Intl.DateTimeFormat>();

/** Dates are shown in the shop's time zone, wherever the screen stands. */
export function setShopZone(timeZone: string): void {
  zone = timeZone;
  formats = new Map();
}

/** Making a format is slow, and a list needs the same one a hundred times. */
function format(name: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const kept = formats.get(name);
  if (kept) return kept;
  const made = new Intl.DateTimeFormat(name === 'iso' ? 'en-CA' : 'en-GB', { timeZone: zone, ...options });
  formats.set(name, made);
  return made;
}

const DAY = { day: 'numeric', month: 'short', year: 'numeric' } as const;
const TIME = { hour: '2-digit', minute: '2-digit' } as const;

/** `1 Dec 2026` of an instant. */
export const dayOf = (iso: string): string => format('day', DAY).format(new Date(iso));
/** `1 Dec 2026, 13:45` of an instant. */
export const momentOf = (iso: string): string => format('moment', { ...DAY, ...TIME }).format(new Date(iso));
/** `13:45` of an instant. */
export const timeOf = (iso: string): string => format('time', TIME).format(new Date(iso));

/** A calendar date as it is, without any zone: `1 Dec 2026` of `2026-12-01`. */
export function calendarDay(date: string): string {
  const [year, month, day] = date.split('-').map(Number) as [number, number, number];
  return format('calendar', { ...DAY, timeZone: 'UTC' }).format(new Date(Date.UTC(year, month - 1, day)));
}

/** Today in the shop's zone, as yyyy-mm-dd. */
export const shopToday = (now: Date): string => format('iso', { year: 'numeric', month: '2-digit', day: '2-digit' }).format(now);

/** Whole days from one calendar date to another; negative when it is past. */
export const daysBetween = (from: string, to: string): number => Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);

/** `1 234.50 EUR`, for reading; never for computing. */
export const moneyOf = (minor: number, currency: string): string => `${formatMoney(minor, currency)}\u00a0${currency}`;
export const sizeOf = (bytes: number): string => (bytes < 1_000_000 ? `${Math.max(1, Math.round(bytes / 1000))}\u00a0kB` : `${(bytes / 1_000_000).toFixed(1)}\u00a0MB`);
