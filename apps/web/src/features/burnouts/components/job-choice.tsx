import type { WaitingJob } from '@shared/burnouts';
import { useFormContext, useFormState, useWatch } from 'react-hook-form';
import { Empty } from '../../../components/faces.js';
import { CheckField } from '../../../components/fields.js';
import { useUnits } from '../../../components/units.js';
import { chosenJobs, type LoadValues } from '../load-form.js';
import { celsiusWords, limitReasonWords } from '../load-words.js';
import { t } from '../text.js';

/** Who stands before the oven, each a large tick with the limit of its part. */
export function JobChoice({ waiting }: { readonly waiting: readonly WaitingJob[] }) {
  const { control } = useFormContext<LoadValues>();
  const chosen = useWatch({ control, name: 'chosen' });
  const { errors } = useFormState({ control });
  const problem = (errors as { readonly jobs?: { readonly message?: string } }).jobs?.message;
  const system = useUnits();
  const rings = chosenJobs({ chosen }, waiting).filter((job) => job.rings);
  const words = (job: WaitingJob) =>
    [
      job.customer,
      job.own ? `${t('partLimit', { limit: celsiusWords(job.own.limitC, system) })}, ${limitReasonWords(job.own.limitReason)}` : t('notDismantled'),
      job.onHold ? t('held') : '',
      job.step === 'core-test-after' ? t('past') : '',
      job.loads.length > 0 ? t('stoodIn', { numbers: job.loads.join(', ') }) : '',
    ]
      .filter(Boolean)
      .join(' · ');
  if (waiting.length === 0) return <Empty title={t('nobodyWaits')}>{t('nobodyWaitsWords')}</Empty>;
  return (
    <fieldset className="lb-load-choice" aria-describedby="load-jobs-help">
      <legend>{t('which')}</legend>
      <div id="load-jobs-help" className={problem ? 'lb-problem' : 'lb-help'} role={problem ? 'alert' : undefined}>
        {problem ?? t('whichHelp')}
      </div>
      {waiting.map((job) => (
        <CheckField key={job.jobId} control={control} name={`chosen.${job.jobId}`} label={`${job.number} · ${job.machine}`} help={words(job)} />
      ))}
      {rings.map((job) => (
        <CheckField key={`rings-${job.jobId}`} control={control} name={`ringsOff.${job.jobId}`} label={t('ringsOff', { number: job.number })} help={t('ringsHelp')} />
      ))}
    </fieldset>
  );
}
