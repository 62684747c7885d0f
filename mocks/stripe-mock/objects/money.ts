/** Currencies whose smallest unit is the whole one, as the service lists them (docs.stripe.com/currencies). */
const NO_DECIMALS = new Set(['bif', 'clp', 'djf', 'gnf', 'jpy', 'kmf', 'krw', 'mga', 'pyg', 'rwf', 'vnd', 'vuv', 'xaf', 'xof', 'xpf']);
const THREE_DECIMALS = new Set(['bhd', 'jod', 'kwd', 'omr', 'tnd']);

export const decimalsOf = (currency: string): 0 | 2 | 3 => (NO_DECIMALS.has(currency) ? 0 : THREE_DECIMALS.has(currency) ? 3 : 2);

/** The smallest amount a charge may have, in minor units; about half a US dollar. From memory of docs.stripe.com/currencies. */
const SMALLEST: Record<string, number> = { gbp: 30, aed: 200, bgn: 100, czk: 1500, dkk: 250, hkd: 400, huf: 17500, mxn: 1000, myr: 200, nok: 300, pln: 200, ron: 200, sek: 300, thb: 1000 };
export const smallestCharge = (currency: string): number => SMALLEST[currency] ?? (decimalsOf(currency) === 3 ? 200 : 50);
export const LARGEST_CHARGE = 99_999_999;

export function moneyText(amountMinor: number, currency: string): string {
  const decimals = decimalsOf(currency);
  return new Intl.NumberFormat('en-US', {
    style: 'currency',
    currency: currency.toUpperCase(),
    minimumFractionDigits: decimals,
    maximumFractionDigits: decimals,
  }).format(amountMinor / 10 ** decimals);
}

/** The fake's price list: 2.9 % and a fixed part, rounded half up; a dispute costs 15 whole units of the currency. */
export function feeOn(amountMinor: number, currency: string): number {
  const fixed = decimalsOf(currency) === 3 ? 300 : 30;
  return Math.min(amountMinor, Math.floor((amountMinor * 29 + 500) / 1000) + fixed);
}
export const disputeFee = (currency: string): number => 15 * 10 ** decimalsOf(currency);
