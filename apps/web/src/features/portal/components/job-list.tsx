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
export function JobList({ jobs }: { readonly jobs: readonly Job[] }) {
  const here = jobs.filter(inShop);
  const gone = jobs.filter((job) => !inShop(job));
  return (
    <>
      <Panel title={t('jobs')}>
        {here.length === 0 ? <Empty title={t('noJobs')}>{t('noJobsWords')}</Empty> : <Jobs jobs={here} />}
      </Panel>
      {gone.length > 0 && (
        <Panel title={t('jobsBefore')}>
          <Jobs jobs={gone} />
        </Panel>
      )}
    </>
  );
}

function Jobs({ jobs }: { readonly jobs: readonly Job[] }) {
  return (
    <ul className="lb-portal-list">
      {jobs.map((job) => (
        <li key={job.id} className="lb-portal-job">
          <Link to={`/portal/jobs/${job.id}`}>{job.machine}</Link>
          <MiniSpine job={job} />
          <p>{happensNow(job)}</p>
          <p className="muted">
            {[job.number, t('arrived', { day: dayOf(job.receivedAt) }), inShop(job) && job.promisedOn && t('promised', { day: calendarDay(job.promisedOn) })].filter(Boolean).join(' · ')}
          </p>
        </li>
      ))}
    </ul>
  );
}
