import type { LoadPage, LoadRow } from '@shared/burnouts';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Quantity } from '../../../components/quantity.js';
import { StateMark } from '../../../components/state-mark.js';
import { VerdictTag } from '../../../components/verdict-tag.js';
import { calendarDay } from '../../../lib/format.js';
import { t } from '../text.js';
import '../burnouts.css';

const COLUMNS: Column<LoadRow>[] = [
  {
    key: 'load',
    title: t('load'),
    cell: (row) => (
      <Link className="lb-load-link" to={`/bay/burnouts/${row.id}`}>
        {t('loadNo', { number: row.number })}
      </Link>
    ),
  },
  { key: 'oven', title: t('oven'), cell: (row) => row.ovenName },
  { key: 'day', title: t('day'), cell: (row) => <span className="num">{calendarDay(row.day)}</span> },
  { key: 'jobs', title: t('jobs'), cell: (row) => <JobLinks row={row} /> },
  { key: 'peak', title: t('peak'), number: true, cell: (row) => <Quantity si={row.peakC} kind="temperature" /> },
  { key: 'limit', title: t('limit'), number: true, cell: (row) => <Quantity si={row.limitC} kind="temperature" /> },
  { key: 'above', title: t('aboveLimit'), number: true, cell: (row) => <Quantity si={row.minutesAboveLimit === null ? null : Math.round(row.minutesAboveLimit)} kind="duration" /> },
  { key: 'verdict', title: t('verdict'), cell: (row) => (row.verdict ? <VerdictTag verdict={row.verdict} /> : <StateMark tone="waiting" words={t('fileMissing')} />) },
];

/** Every load, the newest first. */
export function LoadList({ page }: { readonly page: LoadPage }) {
  return <DataTable caption={t('caption')} columns={COLUMNS} rows={page.rows} rowKey={(row) => row.id} total={page.total} page={page.page} size={page.size} />;
}

function JobLinks({ row }: { readonly row: LoadRow }) {
  return (
    <span className="lb-load-jobs">
      {row.jobs.map((job) => (
        <Link key={job.jobId} to={`/jobs/${job.jobId}`} title={job.machine}>
          {job.number}
        </Link>
      ))}
    </span>
  );
}
