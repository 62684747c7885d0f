import type { FloorRow } from '@shared/jobs';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { floorPageQuery } from '../../../lib/floor-queries.js';
import { calendarDay, dayOf } from '../../../lib/format.js';
import { stateName, stepName } from '../../../lib/step-names.js';
import { t } from '../text.js';
import './book-in.css';

interface CounterJobsProps {
  readonly title: string;
  /** as the list of jobs is asked for */
  readonly params: string;
  /** the same list on the Floor */
  readonly more: string;
  readonly none: string;
  readonly noneHelp?: string;
  readonly today: string;
  readonly show: 'promise' | 'received';
}

/** A short list of jobs, each one tap away. */
export function CounterJobs({ title, params, more, none, noneHelp, today, show }: CounterJobsProps) {
  const jobs = useQuery(floorPageQuery(params));
  return (
    <Panel title={title} actions={jobs.data && jobs.data.total > jobs.data.rows.length ? <Link to={more}>{t('all')}</Link> : undefined}>
      <Answer query={jobs} isEmpty={(page) => page.rows.length === 0} empty={<Empty title={none}>{noneHelp}</Empty>}>
        {(page) => (
          <ul className="lb-counter-jobs">
            {page.rows.map((job) => (
              <li key={job.id}>
                <Link to={`/jobs/${job.id}`}>
                  <b>{job.number}</b>
                  <span className="num">{show === 'received' ? dayOf(job.receivedAt) : promiseOf(job)}</span>
                  <span>{job.customerName}</span>
                  <Standing job={job} today={show === 'promise' ? today : null} />
                  <span className="muted">{job.machine}</span>
                </Link>
              </li>
            ))}
          </ul>
        )}
      </Answer>
    </Panel>
  );
}

const promiseOf = ({ promisedOn }: FloorRow): string => (promisedOn ? calendarDay(promisedOn) : t('noPromise'));

function Standing({ job, today }: { readonly job: FloorRow; readonly today: string | null }) {
  if (today !== null && job.late) return <span className="late right">{t('late')}</span>;
  if (today !== null && job.promisedOn === today) return <b className="right">{t('today')}</b>;
  return <span className="muted right">{job.state === 'open' || job.state === 'on-hold' ? stepName(job.step) : stateName(job.state)}</span>;
}
