import { formatMoney } from '@libs/money';

/** The figure alone, for columns whose currency is named once. */
export const plainAmount = (minor: number, currency: string): string => formatMoney(minor, currency);

/** The figure with its currency, never parted. */
export const amountWords = (minor: number, currency: string): string => `${formatMoney(minor, currency)}\u00a0${currency}`;

/** 1900 basis points are '19 %'. */
export const rateWords = (basisPoints: number): string => `${withoutEmptyDigits(basisPoints, 2)}\u00a0%`;

/** 6500 thousandths are '6.5'. */
export const quantityWords = (thousandths: number): string => withoutEmptyDigits(thousandths, 3);

function withoutEmptyDigits(value: number, digits: number): string {
  const text = Math.abs(value).toString().padStart(digits + 1, '0');
  const behind = text.slice(-digits).replace(/0+$/, '');
  return `${value < 0 ? '−' : ''}${text.slice(0, -digits)}${behind === '' ? '' : `.${behind}`}`;
}
