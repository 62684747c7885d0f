import { correctLoadSchema, type LoadView, type WaitingJob } from '@shared/burnouts';
import type { BayView } from '@shared/instruments';
import { useState } from 'react';
import { useForm, useFormState, useWatch } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { CheckField, SelectField, TextAreaField, TextField } from '../../../components/fields.js';
import { ConflictNotice } from '../../../components/notices.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useTell } from '../../../components/toaster.js';
import { useUnits } from '../../../components/units.js';
import { problemsOf, showProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useCorrectLoad } from '../api/load-queries.js';
import { atTheirTicks, channelKey, correctionOf, jobsToCorrect, readCorrection, type CorrectionValues } from '../load-form.js';
import { differencesTo } from '../load-differences.js';
import { t } from '../text.js';

interface CorrectLoadProps {
  readonly load: LoadView;
  readonly ovens: BayView['ovens'];
  /** who else stands before the oven */
  readonly waiting: readonly WaitingJob[];
  readonly onClose: () => void;
}

/** What was said of a load, put right with a reason; its file is read again. */
export function CorrectLoad({ load: opened, ovens, waiting, onClose }: CorrectLoadProps) {
  const system = useUnits();
  // as it was when it was opened: a newer one that arrives meanwhile must not sweep away what is typed
  const [load, setLoad] = useState(opened);
  const correct = useCorrectLoad(opened.id);
  const tell = useTell();
  const form = useForm<CorrectionValues>({ defaultValues: correctionOf(opened, system) });
  const { control, setError } = form;
  const candidates = jobsToCorrect(load, waiting);
  const ticked = useWatch({ control, name: 'jobs' });
  const { errors } = useFormState({ control });
  const jobsProblem = (errors as { readonly jobs?: { readonly message?: string } }).jobs?.message;
  const send = (values: CorrectionValues, version = load.version) => {
    const { candidate, problems } = readCorrection(values, { ...load, version }, candidates);
    const sent = candidate.jobs as readonly { readonly jobId: string }[];
    const input = correctLoadSchema.safeParse(candidate);
    if (problems.length > 0 || !input.success) return showProblems([...problems, ...atTheirTicks(input.success ? [] : problemsOf(input.error), sent, 'jobs')], setError);
    correct.mutate(input.data, {
      onSuccess: ({ number }) => {
        tell(t('corrected', { number }));
        onClose();
      },
      onError: (error) => {
        if (error instanceof ApiError) showProblems(atTheirTicks(error.fields, sent, 'jobs'), setError);
      },
    });
  };
  const conflict = correct.error instanceof ApiError && correct.error.code === 'CHANGED_MEANWHILE' ? (correct.error.current as LoadView) : null;
  return (
    <ConfirmDialog open title={t('correctTitle', { number: load.number })} confirm={t('saveCorrection')} pending={correct.isPending} error={conflict ? null : unsaid(correct.error)} onConfirm={() => sendForm(form, (values) => send(values))} onClose={onClose}>
      {conflict && (
        <ConflictNotice
          differences={differencesTo(conflict, form.getValues(), load, candidates, system)}
          onTakeTheirs={() => {
            form.reset({ ...correctionOf(conflict, system), reason: form.getValues('reason') });
            setLoad(conflict);
            correct.reset();
          }}
          onKeepMine={() => sendForm(form, (values) => send(values, conflict.version))}
        />
      )}
      <TextField control={control} name="reason" label={t('why')} help={t('whyHelp')} />
      <SelectField control={control} name="ovenId" label={t('oven')} ask={t('ovenAsk')} options={ovens.map((o) => ({ value: o.id, label: o.name }))} />
      <TextField control={control} name="day" type="date" label={t('day')} />
      <fieldset className="lb-load-choice">
        <legend>{t('which')}</legend>
        {jobsProblem && (
          <div className="lb-problem" role="alert">
            {jobsProblem}
          </div>
        )}
        {candidates.map((job) => (
          <CheckField key={job.jobId} control={control} name={`jobs.${job.jobId}`} label={`${job.number} · ${job.machine}`} />
        ))}
        {candidates
          .filter((job) => job.rings && ticked[job.jobId] === true)
          .map((job) => (
            <CheckField key={`rings-${job.jobId}`} control={control} name={`ringsOff.${job.jobId}`} label={t('ringsOff', { number: job.number })} help={t('ringsHelp')} />
          ))}
      </fieldset>
      {load.file && (
        <>
          <fieldset className="lb-load-choice">
            <legend>{t('whichOnPart')}</legend>
            <div className="lb-help">{t('whichOnPartHelp')}</div>
            {load.file.channels.map((channel, i) => (
              <CheckField key={channel.name} control={control} name={`onPart.${channelKey(i)}`} label={channel.name} />
            ))}
          </fieldset>
          <QuantityField control={control} name="offsetK" kind="temperature-difference" label={t('offsetLabel')} help={t('offsetHelp')} optional />
        </>
      )}
      <TextAreaField control={control} name="remark" label={t('remark')} optional rows={2} />
    </ConfirmDialog>
  );
}
