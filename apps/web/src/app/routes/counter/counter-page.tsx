import { Link } from 'react-router-dom';
import { PageHeader } from '../../../components/panel.js';
import { CounterJobs } from '../../../features/counter/components/counter-jobs.js';
import { t } from '../../../features/counter/text.js';
import { shopToday } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';

/** The counter's day: what can go, what is due, what came in. */
export function CounterPage() {
  const mayBook = useMay('jobs.book');
  const today = shopToday(new Date());
  return (
    <div className="stack">
      <PageHeader
        title={t('counter')}
        actions={
          <>
            <Link className="lb-counter-link" to="/counter/customers">
              {t('customers')}
            </Link>
            {mayBook && (
              <Link className="lb-counter-start" to="/counter/book-in">
                {t('bookIn')}
              </Link>
            )}
          </>
        }
      />
      <div className="lb-counter">
        <CounterJobs title={t('collect')} params="step=ready&sort=promisedOn&size=12" more="/floor?step=ready" none={t('collectNone')} noneHelp={t('collectHelp')} today={today} show="promise" />
        <CounterJobs title={t('due')} params="sort=promisedOn&size=12" more="/floor?sort=promisedOn" none={t('dueNone')} noneHelp={t('dueHelp')} today={today} show="promise" />
        <CounterJobs title={t('recent')} params="state=all&sort=receivedAt&order=desc&size=12" more="/floor?sort=receivedAt&order=desc&state=all" none={t('recentNone')} today={today} show="received" />
      </div>
    </div>
  );
}
