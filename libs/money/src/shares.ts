import { assertMinor, divideHalfAwayFromZero, toMinor } from './minor-units.js';
import { MoneyError } from './money-error.js';

export interface Discounted {
  /** What is taken off, with the sign of the amount. */
  readonly discountMinor: number;
  readonly netMinor: number;
}

/**
 * An amount less a discount in percent. The discount is rounded, a half away from zero, and what is left is the rest:
 * so that the two always add up to the amount.
 *
 *     discount = round(amount · rate)      net = amount − discount
 *
 * | symbol | argument               | unit              | range             |
 * | ------ | ---------------------- | ----------------- | ----------------- |
 * | amount | `amountMinor`          | minor units       | whole             |
 * | rate   | `discountBasisPoints`  | hundredths of a % | whole, 0 … 10 000 |
 *
 * @returns discount and net in minor units.
 * @throws {MoneyError} when the amount is not whole or the rate out of range.
 *
 * Source: common practice; the shop's rule.
 *
 * @example
 * // 2.5 % off 10.20 is 25.5 cents, so 26
 * discounted(1020, 250);
 * // → { discountMinor: 26, netMinor: 994 }
 */
export function discounted(amountMinor: number, discountBasisPoints: number): Discounted {
  const amount = assertMinor('amountMinor', amountMinor);
  if (!Number.isSafeInteger(discountBasisPoints) || discountBasisPoints < 0 || discountBasisPoints > 10_000) {
    throw new MoneyError('discountBasisPoints', 'A discount lies between 0 and 100 %.');
  }
  const discount = divideHalfAwayFromZero(BigInt(amount) * BigInt(discountBasisPoints), 10_000n);
  return { discountMinor: toMinor('discount', discount), netMinor: toMinor('net', BigInt(amount) - discount) };
}

/**
 * Shares an amount out by weights, to the last cent: a discount over lines, a part payment over invoices. Each share is
 * rounded towards zero first; the cents left over go one each to those who lost most, the first ones first.
 *
 * | symbol | argument      | unit        | range                              |
 * | ------ | ------------- | ----------- | ---------------------------------- |
 * | amount | `amountMinor` | minor units | whole                              |
 * | w      | `weights`     | –           | whole, none negative, not all zero |
 *
 * @returns as many shares as weights; they add up to the amount, and none is off its exact share by a whole minor unit.
 * @throws {MoneyError} when the amount or a weight is not whole, a weight is negative, or all are zero.
 *
 * Source: method of the largest remainder; common practice.
 *
 * @example
 * allocate(100, [1, 1, 1]);
 * // → [34, 33, 33]
 */
export function allocate(amountMinor: number, weights: readonly number[]): number[] {
  const amount = BigInt(assertMinor('amountMinor', amountMinor));
  if (!weights.every((w) => Number.isSafeInteger(w) && w >= 0)) throw new MoneyError('weights', 'A weight is a whole number, not negative.');
  const parts = weights.map((w) => BigInt(w));
  const whole = parts.reduce((sum, w) => sum + w, 0n);
  if (whole === 0n) throw new MoneyError('weights', 'There is nobody to share it out to: all weights are zero.');
  const size = amount < 0n ? -amount : amount;
  const shares = parts.map((w) => ({ share: (size * w) / whole, lost: (size * w) % whole }));
  const left = Number(size - shares.reduce((sum, s) => sum + s.share, 0n));
  const byLoss = shares.map((_, i) => i).sort((a, b) => (shares[b]!.lost > shares[a]!.lost ? 1 : shares[b]!.lost < shares[a]!.lost ? -1 : a - b));
  for (const i of byLoss.slice(0, left)) shares[i]!.share += 1n;
  return shares.map((s) => toMinor('share', amount < 0n ? -s.share : s.share));
}
