import { assertMinor, divideHalfAwayFromZero, toMinor } from './minor-units.js';
import { MoneyError } from './money-error.js';

export interface PricedLine {
  /** quantity × 1000: 1500 is one and a half */
  readonly quantityThousandths: number;
  readonly unitPriceMinor: number;
  /** tax rate in hundredths of a percent: 1900 is 19 % */
  readonly taxRateBasisPoints: number;
}

export interface LineAmounts {
  readonly netMinor: number;
  readonly taxMinor: number;
}

/**
 * Net and tax of one line, each rounded to the minor unit, a half away from zero.
 *
 *     net = round(quantity · price)      tax = round(net · rate)
 *
 * | symbol   | argument              | unit              | range               |
 * | -------- | --------------------- | ----------------- | ------------------- |
 * | quantity | `quantityThousandths` | thousandths       | whole, ≥ 0          |
 * | price    | `unitPriceMinor`      | minor units       | whole               |
 * | rate     | `taxRateBasisPoints`  | hundredths of a % | whole, 0 … 10 000   |
 *
 * @returns net and tax in minor units.
 * @throws {MoneyError} when an argument is not whole, out of range, or the amount cannot be reckoned exactly.
 *
 * Source: common practice (rounding per line, half away from zero); the shop's rule.
 *
 * @example
 * // 1.5 h at 85.33 with 19 %: 127.995 rounds to 128.00, its tax is 24.32
 * lineAmounts({ quantityThousandths: 1500, unitPriceMinor: 8533, taxRateBasisPoints: 1900 }).taxMinor;
 * // → 2432
 */
export function lineAmounts({ quantityThousandths, unitPriceMinor, taxRateBasisPoints }: PricedLine): LineAmounts {
  if (!Number.isSafeInteger(quantityThousandths) || quantityThousandths < 0) throw new MoneyError('quantityThousandths', 'A quantity is a whole number of thousandths, not negative.');
  if (!Number.isSafeInteger(taxRateBasisPoints) || taxRateBasisPoints < 0 || taxRateBasisPoints > 10_000) throw new MoneyError('taxRateBasisPoints', 'A tax rate lies between 0 and 100 %.');
  assertMinor('unitPriceMinor', unitPriceMinor);
  const net = divideHalfAwayFromZero(BigInt(quantityThousandths) * BigInt(unitPriceMinor), 1000n);
  const tax = divideHalfAwayFromZero(net * BigInt(taxRateBasisPoints), 10_000n);
  return { netMinor: toMinor('net', net), taxMinor: toMinor('tax', tax) };
}
