import type { FloorPage, FloorRow } from '@shared/jobs';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { MiniSpine } from '../../../components/spine.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { stateName, stepName } from '../../../lib/step-names.js';
import { t } from '../floor-text.js';
import { PromiseMark, WaitingMark } from './job-marks.js';
import './floor.css';

const ended = (row: FloorRow) => row.state !== 'open' && row.state !== 'on-hold';

const columnsFor = (today: string): Column<FloorRow>[] => [
  { key: 'spine', title: t('route'), cell: (row) => <MiniSpine job={row} /> },
  {
    key: 'number',
    title: t('job'),
    sort: 'number',
    cell: (row) => (
      <Link className="lb-number" to={`/jobs/${row.id}`}>
        {row.number}
      </Link>
    ),
  },
  { key: 'customer', title: t('customer'), sort: 'customer', cell: (row) => row.customerName },
  { key: 'machine', title: t('machine'), cell: (row) => row.machine },
  {
    key: 'step',
    title: t('at'),
    sort: 'step',
    cell: (row) => (
      <span className="lb-at">
        <span>{ended(row) ? stateName(row.state) : stepName(row.step)}</span>
        <WaitingMark {...row} />
      </span>
    ),
  },
  { key: 'promised', title: t('promised'), sort: 'promisedOn', cell: (row) => <PromiseMark promisedOn={row.promisedOn} today={today} ended={!row.late && ended(row)} /> },
  { key: 'core', title: t('core'), cell: (row) => (isVerdict(row.coreVerdict) ? <VerdictTag verdict={row.coreVerdict} /> : <span className="muted">–</span>) },
];

/** The jobs of the list, each with its spine. */
export function FloorTable({ page, today }: { readonly page: FloorPage; readonly today: string }) {
  return (
    <div className="lb-floor">
      <DataTable caption={t('caption')} columns={columnsFor(today)} rows={page.rows} rowKey={(row) => row.id} total={page.total} page={page.page} size={page.size} sortedBy={{ sort: 'promisedOn', order: 'asc' }} />
    </div>
  );
}
