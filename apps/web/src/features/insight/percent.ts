/** `+3.1 %`, `−1.2 %`: a change always says its direction. */
export function percentWords(fraction: number): string {
  const tenths = Math.round(fraction * 1000) / 10;
  return `${tenths < 0 ? '−' : tenths > 0 ? '+' : ''}${Math.abs(tenths).toFixed(1)}\u202f%`;
}

/** A limit is said without a sign. */
export const limitWords = (fraction: number): string => `${Number((fraction * 100).toFixed(1))}\u202f%`;
