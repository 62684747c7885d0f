import type { CustomerPage } from '@shared/customers';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { t } from '../text.js';
import './customers.css';

type Row = CustomerPage['rows'][number];
const COLUMNS: Column<Row>[] = [
  {
    key: 'name',
    title: t('name'),
    cell: (row) => (
      <Link className="lb-name" to={`/counter/customers/${row.id}`}>
        {row.name}
      </Link>
    ),
  },
  { key: 'city', title: t('city'), cell: (row) => row.city || '–' },
  { key: 'email', title: t('email'), cell: (row) => row.email },
  { key: 'open', title: t('openJobs'), number: true, cell: (row) => row.openJobs },
  { key: 'machines', title: t('machines'), number: true, cell: (row) => row.machines },
];

export function CustomerList({ page }: { readonly page: CustomerPage }) {
  return <DataTable caption={t('caption')} columns={COLUMNS} rows={page.rows} rowKey={(row) => row.id} total={page.total} page={page.page} size={page.size} />;
}
