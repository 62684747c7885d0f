import { lineAmounts, type PricedLine } from './line-amounts.js';
import { toMinor } from './minor-units.js';

export interface TaxOfRate {
  readonly taxRateBasisPoints: number;
  readonly netMinor: number;
  readonly taxMinor: number;
}

export interface Totals<L extends PricedLine> {
  readonly lines: readonly (L & { readonly netMinor: number; readonly taxMinor: number })[];
  /** one entry a rate, lowest rate first */
  readonly taxSummary: readonly TaxOfRate[];
  readonly netMinor: number;
  readonly taxMinor: number;
  readonly grossMinor: number;
}

/**
 * Adds up priced lines: net, tax by rate, and gross. What is added is what is printed on the lines.
 *
 * | symbol | argument | unit | range                     |
 * | ------ | -------- | ---- | ------------------------- |
 * | –      | `lines`  | –    | as for `lineAmounts`      |
 *
 * @returns the lines with their amounts, the summary by rate, and the sums in minor units.
 * @throws {MoneyError} as `lineAmounts` does, or when a sum cannot be reckoned exactly.
 *
 * Source: common practice (tax per line by rate); the shop's rule.
 *
 * @example
 * totals([{ quantityThousandths: 2000, unitPriceMinor: 5, taxRateBasisPoints: 1900 }, { quantityThousandths: 1000, unitPriceMinor: 100, taxRateBasisPoints: 700 }]).grossMinor;
 * // → 119
 */
export function totals<L extends PricedLine>(lines: readonly L[]): Totals<L> {
  const priced = lines.map((line) => ({ ...line, ...lineAmounts(line) }));
  const byRate = new Map<number, { net: bigint; tax: bigint }>();
  for (const line of priced) {
    const sum = byRate.get(line.taxRateBasisPoints) ?? { net: 0n, tax: 0n };
    byRate.set(line.taxRateBasisPoints, { net: sum.net + BigInt(line.netMinor), tax: sum.tax + BigInt(line.taxMinor) });
  }
  const sums = [...byRate.entries()].sort(([a], [b]) => a - b);
  const net = sums.reduce((total, [, s]) => total + s.net, 0n);
  const tax = sums.reduce((total, [, s]) => total + s.tax, 0n);
  return {
    lines: priced,
    taxSummary: sums.map(([rate, s]) => ({ taxRateBasisPoints: rate, netMinor: toMinor('net', s.net), taxMinor: toMinor('tax', s.tax) })),
    netMinor: toMinor('net', net),
    taxMinor: toMinor('tax', tax),
    grossMinor: toMinor('gross', net + tax),
  };
}
