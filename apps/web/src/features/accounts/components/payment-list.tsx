import { formatMoney } from '@libs/money';
import type { InvoiceView } from '@shared/invoices';
import { DataTable, type Column } from '../../../components/data-table.js';
import { calendarDay, momentOf } from '../../../lib/format.js';
import { t } from '../invoice-text.js';

type Payment = InvoiceView['payments'][number];

/** A transfer is known by its day alone; a card payment by the minute. */
export const receivedWords = (receivedAt: string): string => (/^\d{4}-\d{2}-\d{2}$/.test(receivedAt) ? calendarDay(receivedAt) : momentOf(receivedAt));

const COLUMNS: readonly Column<Payment>[] = [
  { key: 'when', title: t('when'), cell: (p) => receivedWords(p.receivedAt) },
  { key: 'kind', title: t('kind'), cell: (p) => t(p.kind) },
  { key: 'reference', title: t('reference'), cell: (p) => p.reference || '–' },
  { key: 'by', title: t('recordedBy'), cell: (p) => p.recordedBy || '–' },
  { key: 'amount', title: t('amount'), number: true, cell: (p) => formatMoney(p.amountMinor, p.currency) },
];

export function PaymentList({ payments }: { readonly payments: readonly Payment[] }) {
  if (payments.length === 0) return <p className="muted">{t('noPayments')}</p>;
  return <DataTable caption={t('paymentsCaption')} columns={COLUMNS} rows={payments} rowKey={(p) => p.id} />;
}
