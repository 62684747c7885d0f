import type { MachinePage } from '@shared/machines';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Answer, Empty } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { machinesQuery } from '../../../lib/customer-queries.js';
import { t } from '../text.js';
import './customers.css';

type Row = MachinePage['rows'][number];
const COLUMNS: Column<Row>[] = [
  {
    key: 'description',
    title: t('description'),
    cell: (row) => (
      <Link className="lb-name" to={`/counter/machines/${row.id}`}>
        {row.description}
      </Link>
    ),
  },
  { key: 'serial', title: t('serial'), cell: (row) => row.serial || '–' },
  { key: 'visits', title: t('visits'), number: true, cell: (row) => row.visits },
  { key: 'last', title: t('lastJob'), cell: (row) => row.lastJobNumber ?? '–' },
];

export function CustomerMachines({ customerId, name, page }: { readonly customerId: string; readonly name: string; readonly page: string }) {
  const machines = useQuery(machinesQuery({ customerId, page }));
  return (
    <Panel title={t('machinesOf', { name })}>
      <Answer query={machines} isEmpty={(data) => data.rows.length === 0} empty={<Empty title={t('noMachines')}>{t('noMachinesHelp')}</Empty>}>
        {(data) => <DataTable caption={t('machinesOf', { name })} columns={COLUMNS} rows={data.rows} rowKey={(row) => row.id} total={data.total} page={data.page} size={data.size} />}
      </Answer>
    </Panel>
  );
}
