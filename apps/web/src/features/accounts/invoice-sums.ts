import type { InvoiceView } from '@shared/invoices';
import { moneyOf } from '../../lib/format.js';

/** What is still owed on these invoices, one amount a currency; money of two currencies is never added up. */
export function owedWords(rows: readonly Pick<InvoiceView, 'currency' | 'balanceMinor'>[]): string | null {
  const owed = new Map<string, number>();
  for (const { currency, balanceMinor } of rows) owed.set(currency, (owed.get(currency) ?? 0) + balanceMinor);
  const words = [...owed].filter(([, minor]) => minor !== 0).map(([currency, minor]) => moneyOf(minor, currency));
  return words.length === 0 ? null : words.join(', ');
}
