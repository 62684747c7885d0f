import { daysBetween } from '../../lib/format.js';

export type PromiseStanding = { readonly kind: 'none' } | { readonly kind: 'late'; readonly days: number } | { readonly kind: 'today' } | { readonly kind: 'ahead'; readonly days: number };

/** How a promise stands today; a job that has ended is late no more. */
export function promiseStanding(promisedOn: string | null, today: string, ended = false): PromiseStanding {
  if (promisedOn === null) return { kind: 'none' };
  const days = daysBetween(today, promisedOn);
  if (ended || days > 0) return { kind: 'ahead', days: Math.max(days, 0) };
  return days === 0 ? { kind: 'today' } : { kind: 'late', days: -days };
}
