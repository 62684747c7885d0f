import type { PortalHome } from '@shared/portal';
import { Link } from 'react-router-dom';
import { Empty } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { MiniSpine } from '../../../components/spine.js';
import { calendarDay, dayOf } from '../../../lib/format.js';
import { happensNow } from '../plain-words.js';
import { t } from '../text.js';
import './portal.css';

type Job = PortalHome['jobs'][number];
const inShop = ({ state }: Job) => state === 'open' || state === 'on-hold';

/** The customer's machines that are here, and those that were. */
export function JobList({ home: { jobs, quotesToAnswer } }: { readonly home: PortalHome }) {
  const asked = new Set(quotesToAnswer.map((quote) => quote.jobId));
  const here = jobs.filter(inShop);
  const gone = jobs.filter((job) => !inShop(job));
  return (
    <>
      <Panel title={t('jobs')}>
        {here.length === 0 ? <Empty title={t('noJobs')}>{t('noJobsWords')}</Empty> : <Jobs jobs={here} asked={asked} />}
      </Panel>
      {gone.length > 0 && (
        <Panel title={t('jobsBefore')}>
          <Jobs jobs={gone} asked={asked} />
        </Panel>
      )}
    </>
  );
}

function Jobs({ jobs, asked }: { readonly jobs: readonly Job[]; readonly asked: ReadonlySet<string> }) {
  return (
    <ul className="lb-portal-list">
      {jobs.map((job) => (
        <li key={job.id} className="lb-portal-job">
          <Link to={`/portal/jobs/${job.id}`}>{job.machine}</Link>
          <MiniSpine job={job} />
          <p>{happensNow(job, asked.has(job.id) ? ['sent'] : 'unknown')}</p>
          <p className="muted">
            {[job.number, t('arrived', { day: dayOf(job.receivedAt) }), inShop(job) && job.promisedOn && t('promised', { day: calendarDay(job.promisedOn) })].filter(Boolean).join(' · ')}
          </p>
        </li>
      ))}
    </ul>
  );
}
