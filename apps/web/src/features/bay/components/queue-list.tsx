import type { FloorRow } from '@shared/jobs';
import type { Step } from '@shared/route';
import { Link, useSearchParams } from 'react-router-dom';
import { Empty } from '../../../components/faces.js';
import { MiniSpine } from '../../../components/spine.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { calendarDay } from '../../../lib/format.js';
import { recordName } from '../../../lib/record-names.js';
import { stepName } from '../../../lib/step-names.js';
import { queueOf, type QueueEntry } from '../queue.js';
import { t } from '../text.js';
import '../bay.css';

/** The technician's queue: a row for a glove each, with the next record to make as one big button. */
export function QueueList({ rows, total }: { readonly rows: readonly FloorRow[]; readonly total: number }) {
  const [params] = useSearchParams();
  const asked = params.get('step') as Step | null;
  const queue = queueOf(rows, asked);
  const waiting = queue.counts.reduce((sum, c) => sum + c.jobs, 0);
  return (
    <div className="stack">
      <nav className="lb-queue-steps" aria-label={t('filter')}>
        <Link to="/bay" aria-current={asked === null ? 'true' : undefined}>
          {t('all', { n: waiting })}
        </Link>
        {queue.counts.map(({ step, jobs }) => (
          <Link key={step} to={`/bay?step=${step}`} aria-current={asked === step ? 'true' : undefined}>
            {t('step', { step: stepName(step), n: jobs })}
          </Link>
        ))}
      </nav>
      {queue.now.length === 0 ? (
        <Empty title={asked === null ? t('nothing') : t('nothingAtStep')}>{t('nothingWords')}</Empty>
      ) : (
        <ul className="lb-queue">
          {queue.now.map((entry) => (
            <Row key={entry.job.id} entry={entry} />
          ))}
        </ul>
      )}
      {queue.held.length > 0 && (
        <section>
          <h2>{t('held', { n: queue.held.length })}</h2>
          <ul className="lb-queue lb-queue-held">
            {queue.held.map((entry) => (
              <Row key={entry.job.id} entry={entry} />
            ))}
          </ul>
        </section>
      )}
      {total > rows.length && (
        <p className="muted">
          {t('more', { n: rows.length })} <Link to="/floor">{t('toFloor')}</Link>
        </p>
      )}
    </div>
  );
}

function Row({ entry: { job, work } }: { readonly entry: QueueEntry }) {
  const [next, ...others] = work;
  const held = job.state === 'on-hold';
  return (
    <li>
      <MiniSpine job={job} />
      <div className="lb-queue-job">
        <Link to={`/jobs/${job.id}`}>
          <b>{job.number}</b>
        </Link>{' '}
        {job.machine}
        <div className="muted">
          {job.customerName} · {stepName(job.step)} · {job.promisedOn === null ? t('noPromise') : t('promised', { day: calendarDay(job.promisedOn) })}
          {held && job.holdReason ? ` · ${job.holdReason}` : ''}
        </div>
      </div>
      <div className="lb-queue-marks">
        {job.late && (
          <span className="lb-queue-late">
            <svg viewBox="0 0 16 16" width="15" height="15" aria-hidden="true">
              <path d="M3 15V1H13L10 5L13 9H4.5" fill="currentColor" />
            </svg>
            {t('late')}
          </span>
        )}
        {isVerdict(job.coreVerdict) && (
          <span className="lb-queue-core">
            <span className="muted">{t('core')}</span> <VerdictTag verdict={job.coreVerdict} />
          </span>
        )}
      </div>
      {!held && (
        <div className="lb-queue-work">
          {others.map((kind) => (
            <Link key={kind} className="lb-queue-other" to={`/jobs/${job.id}/work/${kind}`}>
              {recordName(kind)}
            </Link>
          ))}
          {next && (
            <Link className="lb-queue-next" to={`/jobs/${job.id}/work/${next}`}>
              {recordName(next)}
            </Link>
          )}
        </div>
      )}
    </li>
  );
}
