import { MoneyError } from './money-error.js';

/** ISO 4217 currencies whose minor unit is not a hundredth. */
const NO_DECIMALS = new Set(['BIF', 'CLP', 'DJF', 'GNF', 'ISK', 'JPY', 'KMF', 'KRW', 'PYG', 'RWF', 'UGX', 'UYI', 'VND', 'VUV', 'XAF', 'XOF', 'XPF']);
const THREE_DECIMALS = new Set(['BHD', 'IQD', 'JOD', 'KWD', 'LYD', 'OMR', 'TND']);

/**
 * Decimals of a currency's minor unit.
 *
 * | symbol | argument   | unit | range                       |
 * | ------ | ---------- | ---- | --------------------------- |
 * | –      | `currency` | –    | three capital letters       |
 *
 * @returns 0, 2 or 3.
 * @throws {MoneyError} when `currency` is not three capital letters.
 *
 * Source: ISO 4217, list of minor units; from memory. A currency that is not listed apart has two decimals.
 *
 * @example
 * currencyDigits('BHD');
 * // → 3
 */
export function currencyDigits(currency: string): 0 | 2 | 3 {
  if (!/^[A-Z]{3}$/.test(currency)) throw new MoneyError('currency', 'A currency is three capital letters, like EUR.');
  if (NO_DECIMALS.has(currency)) return 0;
  return THREE_DECIMALS.has(currency) ? 3 : 2;
}
