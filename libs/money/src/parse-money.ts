import { currencyDigits } from './currency.js';

export type ParsedMoney = { readonly ok: true; readonly amountMinor: number } | { readonly ok: false; readonly code: 'empty' | 'not-a-number' | 'ambiguous' | 'too-many-decimals' | 'too-large'; readonly words: string };
const refuse = (code: Extract<ParsedMoney, { ok: false }>['code'], words: string): ParsedMoney => ({ ok: false, code, words });

/**
 * Reads a typed amount: decimal comma or point, groups of three, an optional currency code or minus sign.
 *
 * | symbol | argument   | unit | range                 |
 * | ------ | ---------- | ---- | --------------------- |
 * | –      | `text`     | –    | any text              |
 * | –      | `currency` | –    | three capital letters |
 *
 * @returns the amount in minor units, or why the text is none, in words that say what to do.
 * @throws {MoneyError} when the currency is not three letters.
 *
 * Source: common practice.
 *
 * @example
 * parseMoney('1.234,5', 'EUR').amountMinor;
 * // → 123450
 */
export function parseMoney(text: string, currency: string): ParsedMoney {
  const digits = currencyDigits(currency);
  const bare = text
    .trim()
    .replace(new RegExp(`^${currency}\\s*|\\s*${currency}$`, 'i'), '')
    .replace(/[\s\u00a0\u202f'’]/g, '')
    .replace(/^−/, '-');
  if (bare === '') return refuse('empty', 'Type an amount.');
  const form = /^(-?)(\d[\d.,]*)$/.exec(bare);
  if (!form) return refuse('not-a-number', 'Only digits, one decimal comma or point, and a currency.');
  const split = splitDecimals(form[2]!, digits);
  if (!split) return refuse('ambiguous', 'It is not clear where the decimals begin; type the amount without signs between thousands.');
  if (split.decimals.length > digits) return refuse('too-many-decimals', digits === 0 ? `${currency} has no decimals.` : `${currency} has ${digits} decimals.`);
  const amountMinor = Number(split.whole + split.decimals.padEnd(digits, '0'));
  if (!Number.isSafeInteger(amountMinor)) return refuse('too-large', 'That is too large an amount.');
  return { ok: true, amountMinor: form[1] === '-' && amountMinor !== 0 ? -amountMinor : amountMinor };
}

/** Where both signs stand, the last one is the decimal sign; a single one is it unless it can only group. */
function splitDecimals(text: string, digits: number): { whole: string; decimals: string } | null {
  const last = Math.max(text.lastIndexOf('.'), text.lastIndexOf(','));
  if (last < 0) return { whole: text, decimals: '' };
  const sign = text[last]!;
  const other = sign === '.' ? ',' : '.';
  const single = text.indexOf(sign) === last;
  if (!single) return isGrouped(text, sign) && !text.includes(other) ? { whole: text.replaceAll(sign, ''), decimals: '' } : null;
  const whole = text.slice(0, last);
  const decimals = text.slice(last + 1);
  if (whole.includes(other)) return isGrouped(whole, other) ? { whole: whole.replaceAll(other, ''), decimals } : null;
  // "1.234": three digits behind a lone sign are thousands where the currency has no three decimals
  if (decimals.length === 3 && digits !== 3 && /^[1-9]\d{0,2}$/.test(whole)) return digits === 0 ? { whole: whole + decimals, decimals: '' } : null;
  return { whole, decimals };
}

const isGrouped = (text: string, sign: string): boolean => new RegExp(`^\\d{1,3}(\\${sign}\\d{3})+$`).test(text);
