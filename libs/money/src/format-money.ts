import { currencyDigits } from './currency.js';
import { assertMinor } from './minor-units.js';

export interface MoneyFormat {
  /** between groups of three digits; a narrow no-break space unless told */
  readonly group?: string;
  readonly decimal?: string;
}

/**
 * Writes an amount with its currency's decimals, digits in groups of three, a true minus sign, and no currency.
 *
 * | symbol | argument      | unit        | range                 |
 * | ------ | ------------- | ----------- | --------------------- |
 * | –      | `amountMinor` | minor units | whole                 |
 * | –      | `currency`    | –           | three capital letters |
 *
 * @returns the digits, such as `1 234.50` for 123450 EUR, `500` for 500 JPY and `5.120` for 5120 BHD.
 * @throws {MoneyError} when the amount is not whole or the currency not three letters.
 *
 * Source: common practice; decimals by ISO 4217.
 *
 * @example
 * formatMoney(5120, 'BHD');
 * // → "5.120"
 */
export function formatMoney(amountMinor: number, currency: string, { group = '\u202f', decimal = '.' }: MoneyFormat = {}): string {
  const amount = assertMinor('amount', amountMinor);
  const digits = currencyDigits(currency);
  const text = Math.abs(amount).toString().padStart(digits + 1, '0');
  const whole = text.slice(0, text.length - digits).replace(/\B(?=(\d{3})+$)/g, group);
  const behind = digits === 0 ? '' : `${decimal}${text.slice(-digits)}`;
  return `${amount < 0 ? '−' : ''}${whole}${behind}`;
}
