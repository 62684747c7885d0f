import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { MoneyLines } from '../../../components/money-lines.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { portalJobQuery, portalQuoteQuery } from '../../../features/portal/api/portal-queries.js';
import { QuoteAnswer } from '../../../features/portal/components/quote-answer.js';
import { t } from '../../../features/portal/text.js';
import { calendarDay } from '../../../lib/format.js';

/** A quote, and the customer's answer to it. */
export function PortalQuotePage() {
  const { id = '' } = useParams();
  const quote = useQuery(portalQuoteQuery(id));
  const { data: job } = useQuery({ ...portalJobQuery(quote.data?.jobId ?? ''), enabled: quote.data !== undefined });
  const paperNumber = quote.data && (quote.data.revision === 1 ? quote.data.number : `${quote.data.number}-r${quote.data.revision}`);
  const paper = job?.papers.find((p) => p.kind === 'quote' && p.number === paperNumber);
  return (
    <Answer query={quote}>
      {(data) => (
        <div className="stack">
          <PageHeader
            title={t('quoteTitle', { number: data.number })}
            below={
              <>
                {t('quoteBelowShort')} <Link to={`/portal/jobs/${data.jobId}`}>{job ? `${data.jobNumber}, ${job.machine}` : data.jobNumber}</Link>
                {data.state === 'sent' && !data.expired && <div>{t('validUntil', { day: calendarDay(data.validUntil) })}</div>}
              </>
            }
          />
          <QuoteAnswer quote={data} />
          <Panel
            title={t('lines')}
            actions={
              paper && (
                <a href={`/api/portal/papers/${paper.id}/pdf`} target="_blank" rel="noreferrer">
                  {t('pdf')}
                </a>
              )
            }
          >
            <MoneyLines of={data} caption={t('linesCaption')} />
          </Panel>
          {data.note && (
            <Panel title={t('note')}>
              <p className="lb-plain-note">{data.note}</p>
            </Panel>
          )}
        </div>
      )}
    </Answer>
  );
}
