import { parseMoney } from '@libs/money';
import type { InvoiceView, RecordPayment } from '@shared/invoices';
import { moneyOf } from '../../lib/format.js';
import type { FormProblem } from '../../lib/typed.js';
import { t } from './invoice-text.js';
import { plainMoney } from './quote-form.js';

export interface PaymentForm {
  kind: RecordPayment['kind'];
  amountMinor: string;
  receivedOn: string | null;
  reference: string;
}

/** Mostly the whole balance comes in at once. */
export const paymentFormOf = (invoice: Pick<InvoiceView, 'balanceMinor' | 'currency'>, today: string): PaymentForm => ({
  kind: 'bank-transfer',
  amountMinor: plainMoney(invoice.balanceMinor, invoice.currency),
  receivedOn: today,
  reference: '',
});

/** What will be recorded, and what stands in its way. More than is owed is said before it is sent. */
export function readPayment(form: PaymentForm, version: number, { balanceMinor, currency }: Pick<InvoiceView, 'balanceMinor' | 'currency'>): { readonly candidate: unknown; readonly problems: readonly FormProblem[] } {
  const problems: FormProblem[] = [];
  const money = parseMoney(form.amountMinor, currency);
  if (!money.ok) problems.push({ path: 'amountMinor', message: money.code === 'empty' ? t('needAmount') : money.words });
  else if (money.amountMinor <= 0) problems.push({ path: 'amountMinor', message: t('needMore') });
  else if (money.amountMinor > balanceMinor) problems.push({ path: 'amountMinor', message: t('tooMuch', { money: moneyOf(balanceMinor, currency) }) });
  if (!form.receivedOn) problems.push({ path: 'receivedOn', message: t('needDay') });
  return { candidate: { version, kind: form.kind, amountMinor: money.ok ? money.amountMinor : Number.NaN, receivedOn: form.receivedOn ?? '', reference: form.reference }, problems };
}
