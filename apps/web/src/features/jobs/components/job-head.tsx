import type { JobSheet } from '@shared/jobs';
import { Link } from 'react-router-dom';
import { PageHeader } from '../../../components/panel.js';
import { MiniSpine } from '../../../components/spine.js';
import { dayOf, shopToday } from '../../../lib/format.js';
import { routeName, stateName } from '../../../lib/step-names.js';
import { isEnded } from '../move-form.js';
import { t } from '../text.js';
import { PromiseMark } from './job-marks.js';

/** Number, whose, what, state and promise: the head of the sheet. */
export function JobHead({ job }: { readonly job: JobSheet }) {
  return (
    <PageHeader
      title={job.number}
      below={
        <span className="lb-job-below">
          <span className="lb-job-mini">
            <MiniSpine job={job} />
          </span>
          <Link to={`/counter/customers/${job.customer.id}`}>{job.customer.name}</Link>
          <Link to={`/counter/machines/${job.machine.id}`}>{job.machine.description}</Link>
          <span>{routeName(job.route)}</span>
          <span>{stateName(job.state)}</span>
          <span>{t('received', { when: dayOf(job.receivedAt) })}</span>
          {job.warrantyOf && (
            <span>
              {t('warranty')} <Link to={`/jobs/${job.warrantyOf.jobId}`}>{job.warrantyOf.jobNumber}</Link>
            </span>
          )}
        </span>
      }
      actions={
        <span className="lb-job-promise">
          <span className="muted">{t('promised')}</span>
          <PromiseMark promisedOn={job.promisedOn} today={shopToday(new Date())} ended={isEnded(job)} />
        </span>
      }
    />
  );
}
