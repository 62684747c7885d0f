/** When a promise that failed is tried again: 5 s, doubling, at most an hour apart, for three days. */
const FIRST_MS = 5_000;
const LONGEST_MS = 3_600_000;
const GIVE_UP_AFTER_MS = 3 * 24 * 3_600_000;

export function nextTry(attempts: number, createdAt: Date, now: Date): { giveUp: true } | { giveUp: false; at: Date } {
  if (now.getTime() - createdAt.getTime() >= GIVE_UP_AFTER_MS) return { giveUp: true };
  const wait = Math.min(FIRST_MS * 2 ** Math.max(0, attempts - 1), LONGEST_MS);
  return { giveUp: false, at: new Date(now.getTime() + wait) };
}
