import type { JobSheet } from '@shared/jobs';
import { RECORD_FROM_STEP, type RecordKind } from '@shared/records';
import { Link } from 'react-router-dom';
import { Empty } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { stepName } from '../../../lib/step-names.js';
import { defineText } from '../../../lib/text.js';

const t = defineText({
  title: 'The job has not come to this yet',
  words: 'It stands at “{at}”; this is recorded from “{from}” on. Move the job first.',
  notYours: 'The bay records this',
  notYoursWords: 'It is not recorded yet, and your role does not record tests. A technician or the manager does.',
  toJob: 'To the job {number}',
});

/** What lies ahead of the job cannot be recorded; the job sheet is where it is moved. */
export function NotOpenYet({ job, kind, title }: { readonly job: JobSheet; readonly kind: RecordKind; readonly title: string }) {
  return (
    <div>
      <PageHeader title={`${title} · ${job.number}`} />
      <Empty title={t('title')}>
        <p>{t('words', { at: stepName(job.step), from: stepName(RECORD_FROM_STEP[kind]) })}</p>
        <p>
          <Link to={`/jobs/${job.id}`}>{t('toJob', { number: job.number })}</Link>
        </p>
      </Empty>
    </div>
  );
}

/** Who may read the job but records no tests finds nothing to fill in here. */
export function NotYours({ job, title }: { readonly job: JobSheet; readonly title: string }) {
  return (
    <div>
      <PageHeader title={title} />
      <Empty title={t('notYours')}>
        <p>{t('notYoursWords')}</p>
        <p>
          <Link to={`/jobs/${job.id}`}>{t('toJob', { number: job.number })}</Link>
        </p>
      </Empty>
    </div>
  );
}
