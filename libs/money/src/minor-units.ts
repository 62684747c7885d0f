import { MoneyError } from './money-error.js';

/** A whole number of minor units that arithmetic is exact for; negative zero becomes zero. */
export function assertMinor(field: string, amount: number): number {
  if (!Number.isSafeInteger(amount)) throw new MoneyError(field, `${field} must be a whole number of minor units.`);
  return amount === 0 ? 0 : amount;
}

/** numerator / denominator to the nearest whole number, a half away from zero; exact, since it never leaves the integers. */
export function divideHalfAwayFromZero(numerator: bigint, denominator: bigint): bigint {
  const negative = numerator < 0n !== denominator < 0n;
  const n = numerator < 0n ? -numerator : numerator;
  const d = denominator < 0n ? -denominator : denominator;
  const rounded = (2n * n + d) / (2n * d);
  return negative ? -rounded : rounded;
}

export function toMinor(field: string, value: bigint): number {
  const amount = Number(value);
  if (!Number.isSafeInteger(amount)) throw new MoneyError(field, `${field} is larger than can be reckoned exactly.`);
  return amount;
}
