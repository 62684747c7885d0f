import { MoneyError, totals, type Totals } from '@libs/money';
import type { QuoteLine } from '@shared/quotes';
import { AppError } from '../http/app-error.js';

export type Sums = Totals<QuoteLine>;

/** Larger than any repair, and what every part of the house can carry. */
const LARGEST_MINOR = 99_999_999_999;

/** The sums of a quote's lines; what cannot be right as money is refused in words. */
export function sumsOf(lines: readonly QuoteLine[]): Sums {
  try {
    const sums = totals(lines);
    if (sums.grossMinor > LARGEST_MINOR) throw new MoneyError('gross', 'The total is larger than a quote can be. Look at the quantities and prices again.');
    return sums;
  } catch (error) {
    if (error instanceof MoneyError) throw new AppError('AMOUNT_NOT_RIGHT', error.message, { cause: error });
    throw error;
  }
}

/** Tax by rate of lines as they were stored; the same arithmetic as when they were priced. */
export const taxSummaryOf = (lines: readonly QuoteLine[]): Sums['taxSummary'] => totals(lines).taxSummary;
