import type { FloorRow } from '@shared/jobs';
import { STEPS, type Step } from '@shared/route';
import { Link } from 'react-router-dom';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { stepName } from '../../../lib/step-names.js';
import { t } from '../floor-text.js';
import { PromiseMark, WaitingMark } from './job-marks.js';
import './floor.css';

/** Every open job under its step, large enough to be read from across the shop. */
export function FloorWall({ rows, today }: { readonly rows: readonly FloorRow[]; readonly today: string }) {
  const byStep = STEPS.map((step): [Step, FloorRow[]] => [step, rows.filter((row) => row.step === step)]).filter(([, jobs]) => jobs.length > 0);
  if (byStep.length === 0) return <p className="lb-wall-empty">{t('wallEmpty')}</p>;
  return (
    <div className="lb-wall-steps">
      {byStep.map(([step, jobs]) => (
        <section key={step}>
          <h2>
            {stepName(step)} <span className="num muted">{jobs.length}</span>
          </h2>
          <ul>
            {jobs.map((job) => (
              <li key={job.id} className={job.state === 'on-hold' ? 'held' : ''}>
                <Link className="lb-number" to={`/jobs/${job.id}`}>
                  {job.number}
                </Link>
                <div>{job.customerName}</div>
                <div className="muted">{job.machine}</div>
                <PromiseMark promisedOn={job.promisedOn} today={today} />
                {isVerdict(job.coreVerdict) && job.coreVerdict !== 'conforms' && <VerdictTag verdict={job.coreVerdict} />}
                <WaitingMark {...job} />
              </li>
            ))}
          </ul>
        </section>
      ))}
    </div>
  );
}
