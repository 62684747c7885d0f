/** Calendar date of an instant in the shop's time zone, as yyyy-mm-dd. */
export function shopDate(at: Date, timeZone: string): string {
  return new Intl.DateTimeFormat('en-CA', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' }).format(at);
}

/** The year a number series is in: it turns in the shop's time zone. */
export function shopYear(at: Date, timeZone: string): number {
  return Number(shopDate(at, timeZone).slice(0, 4));
}

/** A date some days after another, counted on the calendar (no clock involved). */
export function addDays(date: string, days: number): string {
  const [year, month, day] = date.split('-').map(Number) as [number, number, number];
  return new Date(Date.UTC(year, month - 1, day + days)).toISOString().slice(0, 10);
}

/** Whole days from one calendar date to another; negative when the second lies before the first. */
export const daysApart = (from: string, to: string): number => Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);
