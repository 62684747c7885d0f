import { formatMoney } from '@libs/money';
import type { invoicePageSchema } from '@shared/invoices';
import { Link } from 'react-router-dom';
import type { z } from 'zod';
import { DataTable, type Column } from '../../../components/data-table.js';
import { StateMark } from '../../../components/state-mark.js';
import { calendarDay, dayOf, moneyOf } from '../../../lib/format.js';
import { t } from '../invoice-text.js';
import { invoiceStateWords } from '../state-words.js';

type Page = z.infer<typeof invoicePageSchema>;
type Row = Page['rows'][number];

const COLUMNS: readonly Column<Row>[] = [
  { key: 'number', title: t('number'), cell: (row) => <Link to={`/accounts/invoices/${row.id}`} className="num">{row.number}</Link> },
  { key: 'job', title: t('job'), cell: (row) => <Link to={`/jobs/${row.jobId}`} className="num">{row.jobNumber}</Link> },
  { key: 'customer', title: t('customer'), cell: (row) => row.customerName },
  { key: 'state', title: t('stands'), cell: (row) => <StateMark {...invoiceStateWords(row)} /> },
  { key: 'issued', title: t('issued'), cell: (row) => dayOf(row.issuedAt) },
  { key: 'due', title: t('due'), cell: (row) => calendarDay(row.dueOn) },
  { key: 'total', title: t('total'), number: true, cell: (row) => moneyOf(row.grossMinor, row.currency) },
  { key: 'balance', title: t('balance'), number: true, cell: (row) => (row.balanceMinor === 0 ? '–' : formatMoney(row.balanceMinor, row.currency)) },
];

export function InvoiceTable({ page }: { readonly page: Page }) {
  return <DataTable caption={t('caption')} columns={COLUMNS} rows={page.rows} rowKey={(row) => row.id} total={page.total} page={page.page} size={page.size} />;
}
