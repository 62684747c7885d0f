/** Whole days from one calendar date to another; both yyyy-mm-dd. */
export const daysBetween = (from: string, to: string): number => Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);

export type PromiseStanding = { readonly kind: 'none' } | { readonly kind: 'late'; readonly days: number } | { readonly kind: 'today' } | { readonly kind: 'ahead'; readonly days: number };

/** How a promise stands today; a job that has ended is late no more. */
export function promiseStanding(promisedOn: string | null, today: string, ended = false): PromiseStanding {
  if (promisedOn === null) return { kind: 'none' };
  const days = daysBetween(today, promisedOn);
  if (ended || days > 0) return { kind: 'ahead', days: Math.max(days, 0) };
  return days === 0 ? { kind: 'today' } : { kind: 'late', days: -days };
}
