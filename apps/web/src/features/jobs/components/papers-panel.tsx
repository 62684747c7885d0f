import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Empty } from '../../../components/faces.js';
import { ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { momentOf } from '../../../lib/format.js';
import { usePrintTag } from '../api/job-changes.js';
import { paperName, t } from '../work-text.js';

type Paper = JobSheet['papers'][number];

const COLUMNS: Column<Paper>[] = [
  { key: 'paper', title: t('paper'), cell: (p) => paperName(p.kind) },
  { key: 'number', title: t('number'), cell: (p) => <span className="num">{p.number}</span> },
  { key: 'made', title: t('made'), cell: (p) => <span className="num">{momentOf(p.issuedAt)}</span> },
  { key: 'state', title: t('state'), cell: (p) => (p.supersededBy ? <span className="muted">{t('supersededBy', { number: p.supersededBy })}</span> : t('inForce')) },
  {
    key: 'pdf',
    title: t('openPdf'),
    cell: (p) => (
      <a className="lb-number" href={`/api/papers/${p.id}/pdf`} target="_blank" rel="noreferrer" aria-label={t('pdf', { paper: paperName(p.kind), number: p.number })}>
        {t('openPdf')}
      </a>
    ),
  },
];

/** Every paper of the job, the replaced ones too, and the tag to print anew. */
export function PapersPanel({ job }: { readonly job: JobSheet }) {
  const print = usePrintTag(job.id);
  return (
    <Panel title={t('papers')} actions={<Button text={t('printTag')} loading={print.isPending} onClick={() => print.mutate()} />}>
      <ErrorNotice error={print.error} />
      {print.data && (
        <div role="status" className="row">
          <span>{t('tagReady')}</span>
          <a className="lb-number" href={`/api/papers/${print.data.paperId}/pdf`} target="_blank" rel="noreferrer">
            {t('openTag')}
          </a>
        </div>
      )}
      {job.papers.length === 0 ? <Empty title={t('noPapers')} /> : <DataTable caption={t('papers')} columns={COLUMNS} rows={[...job.papers].reverse()} rowKey={(p) => p.id} />}
    </Panel>
  );
}
