import type { MachineView } from '@shared/machines';
import type { RecordView } from '@shared/records';
import { useQueries } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Empty, Waiting } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { signedPercent } from '../../../lib/core-strip.js';
import { dayOf } from '../../../lib/format.js';
import { jobRecordsQuery } from '../../../lib/job-queries.js';
import { coreVisitOf, type CoreVisit } from '../core-visits.js';
import { t } from '../text.js';
import './customers.css';

interface Row extends CoreVisit {
  readonly jobId: string;
  readonly jobNumber: string;
  readonly receivedAt: string;
}

/** The core's loss over every visit of the machine, the oldest first, on one scale. */
export function CoreVisits({ visits }: { readonly visits: MachineView['visits'] }) {
  const inTime = [...visits].sort((a, b) => (a.receivedAt < b.receivedAt ? -1 : 1));
  const answers = useQueries({ queries: inTime.map((visit) => jobRecordsQuery(visit.jobId)) });
  const waiting = answers.some((a) => a.data === undefined && !a.error);
  const failed = inTime.filter((_, i) => answers[i]?.data === undefined && answers[i]?.error);
  const rows = inTime.flatMap((visit, i): Row[] => {
    const records = answers[i]?.data as readonly RecordView[] | undefined;
    const core = records && coreVisitOf(records);
    return core ? [{ ...core, jobId: visit.jobId, jobNumber: visit.jobNumber, receivedAt: visit.receivedAt }] : [];
  });
  const most = Math.max(...rows.flatMap((r) => [r.before?.wattsPerKg ?? 0, r.after?.wattsPerKg ?? 0]), 0);
  return (
    <Panel title={t('core')}>
      {waiting ? (
        <Waiting />
      ) : (
        <div className="stack lb-core-visits">
          {failed.map((visit) => (
            <p key={visit.jobId} role="alert">
              {t('visitFailed', { job: visit.jobNumber })}
            </p>
          ))}
          {rows.length === 0 ? (
            <Empty title={t('coreNone')} />
          ) : (
            <>
              <p className="muted">{t('coreWords')}</p>
              <DataTable caption={t('core')} columns={columnsFor(most)} rows={rows} rowKey={(row) => row.jobId} />
            </>
          )}
        </div>
      )}
    </Panel>
  );
}

const columnsFor = (most: number): Column<Row>[] => [
  {
    key: 'job',
    title: t('job'),
    cell: (row) => (
      <Link className="lb-name num" to={`/jobs/${row.jobId}`}>
        {row.jobNumber}
      </Link>
    ),
  },
  { key: 'received', title: t('received'), cell: (row) => <span className="num">{dayOf(row.receivedAt)}</span> },
  { key: 'flux', title: t('flux'), cell: (row) => <Quantity si={row.fluxDensityT} kind="flux-density" /> },
  { key: 'before', title: t('before'), cell: (row) => <Loss figure={row.before} most={most} before /> },
  { key: 'after', title: t('after'), cell: (row) => <Loss figure={row.after} most={most} /> },
  { key: 'increase', title: t('increase'), cell: (row) => (row.increase === null ? <span className="muted">{t('notEstablished')}</span> : <b className="num">{signedPercent(row.increase)}</b>) },
  { key: 'verdict', title: t('verdict'), cell: (row) => (isVerdict(row.verdict) ? <VerdictTag verdict={row.verdict} /> : '–') },
];

/** The figure, and a bar of the same scale in every row. */
function Loss({ figure, most, before = false }: { readonly figure: CoreVisit['before']; readonly most: number; readonly before?: boolean }) {
  if (!figure) return <span className="muted">–</span>;
  return (
    <span className="lb-core-cell">
      <Quantity si={figure.wattsPerKg} kind="specific-loss" /> <span className="muted">±</span> <Quantity si={figure.expandedUncertaintyWPerKg} kind="specific-loss" />
      <span className={`lb-core-bar${before ? ' lb-core-bar-before' : ''}`} style={{ width: `${(figure.wattsPerKg / (most || 1)) * 100}%` }} aria-hidden="true" />
    </span>
  );
}
