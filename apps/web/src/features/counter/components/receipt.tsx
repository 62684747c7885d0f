import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { usePrintTag } from '../api/counter-queries.js';
import { t } from '../text.js';
import './book-in.css';

/** After booking in: the number large, the tag, the customer's receipt, and what comes next. */
export function Receipt({ job, photos }: { readonly job: JobSheet; readonly photos: ReactNode }) {
  const print = usePrintTag(job.id);
  const acknowledgement = job.papers.filter((p) => p.kind === 'acknowledgement' && p.supersededBy === null).at(-1);
  return (
    <div className="stack">
      <Panel>
        <div className="lb-receipt">
          <p className="lb-receipt-number">{job.number}</p>
          <p>{t('receiptWords', { customer: job.customer.name, machine: job.machine.description })}</p>
          <p>{t('tagFirst')}</p>
          <ErrorNotice error={print.error} />
          <div className="lb-receipt-next">
            {print.data ? (
              <a href={`/api/papers/${print.data.paperId}/pdf`} target="_blank" rel="noreferrer">
                {t('openTag')}
              </a>
            ) : (
              <Button intent="primary" size="large" text={t('printTag')} loading={print.isPending} onClick={() => print.mutate()} />
            )}
            {acknowledgement && (
              <a href={`/api/papers/${acknowledgement.id}/pdf`} target="_blank" rel="noreferrer">
                {t('receiptPdf')}
              </a>
            )}
            <Link to={`/jobs/${job.id}`}>{t('openJob')}</Link>
            <Link to="/counter/book-in">{t('another')}</Link>
          </div>
        </div>
      </Panel>
      {photos}
    </div>
  );
}
