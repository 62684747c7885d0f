import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { calendarDay, moneyOf } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import { waitingQuotesQuery } from '../api/accounts-queries.js';
import { t } from '../invoice-text.js';
import { quoteStateWords } from '../state-words.js';
import { t as words } from '../text.js';
import './accounts.css';

/** Jobs that wait for the customer's word: which quote is out, and which still has to be written. */
export function WaitingQuotes() {
  const waiting = useQuery(waitingQuotesQuery);
  const mayWrite = useMay('quotes.write');
  return (
    <Panel title={t('waiting')}>
      <Answer query={waiting} isEmpty={(data) => data.jobs.length === 0} empty={<p className="muted">{t('nobodyWaits')}</p>}>
        {(data) => (
          <>
            <ul className="lb-money-list">
              {data.jobs.map(({ job, quotes }) => {
                const quote = quotes.find((q) => q.state !== 'superseded');
                return (
                  <li key={job.id}>
                    <div className="row spread">
                      <span className="row">
                        <Link to={`/jobs/${job.id}?tab=money`} className="num">
                          {job.number}
                        </Link>
                        <span>{job.customerName}</span>
                        <span className="muted">{job.machine}</span>
                      </span>
                      {quote && <b className="num">{moneyOf(quote.grossMinor, quote.currency)}</b>}
                    </div>
                    <div className="row">
                      {quote ? (
                        <>
                          <Link to={`/accounts/quotes/${quote.id}`} className="num">
                            {quote.number}
                          </Link>
                          <StateMark {...quoteStateWords(quote)} />
                          <span className="muted">{words('validUntil', { day: calendarDay(quote.validUntil) })}</span>
                        </>
                      ) : (
                        <>
                          <StateMark tone="open" words={t('noQuoteYet')} />
                          {mayWrite && <Link to={`/jobs/${job.id}/quotes/new`}>{t('writeQuote')}</Link>}
                        </>
                      )}
                    </div>
                  </li>
                );
              })}
            </ul>
            {data.total > data.jobs.length && (
              <p className="muted">
                {t('moreWaiting', { shown: data.jobs.length, total: data.total })} <Link to="/floor?step=awaiting-approval">{t('toFloor')}</Link>
              </p>
            )}
          </>
        )}
      </Answer>
    </Panel>
  );
}
