import { Button } from '@blueprintjs/core';
import { CONTAMINATIONS, updateJobSchema, type JobSheet } from '@shared/jobs';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { SelectField, TextAreaField, TextField } from '../../../components/fields.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { useTell } from '../../../components/toaster.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useUpdateJob } from '../api/job-changes.js';
import { differencesOf, theirsOf } from '../facts-conflict.js';
import { factsFormOf, isEnded, type FactsForm } from '../move-form.js';
import { CONTAMINATION_WORDS, t } from '../text.js';

const OPTIONS = CONTAMINATIONS.map((value) => ({ value, label: CONTAMINATION_WORDS[value] ?? value }));

/** Changes what was taken in. Two people at once: both values side by side, and the person decides. */
export function EditFacts({ job, onDone }: { readonly job: JobSheet; readonly onDone: () => void }) {
  const update = useUpdateJob(job.id);
  const tell = useTell();
  const form = useForm<FactsForm>({ defaultValues: factsFormOf(job) });
  const { control, clearErrors, handleSubmit, setError, reset, getValues } = form;
  const [basis] = useState(job.version);
  const draft = useDraft(form, `job-facts:${job.id}`, { basis });
  // the version the person has read: a refreshed sheet must not turn their save into a silent overwrite
  const [version, setVersion] = useState(job.version);
  const conflict = update.error instanceof ApiError && update.error.code === 'CHANGED_MEANWHILE' ? theirsOf(update.error.current) : null;
  const save = (values: FactsForm, asOf: number) => {
    const input = checked(updateJobSchema, { ...values, version: asOf }, setError);
    if (!input) return;
    update.mutate(input, {
      onSuccess: () => {
        draft.forget();
        tell(t('saved'));
        onDone();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        sendForm({ clearErrors, handleSubmit }, (values) => save(values, version));
      }}
    >
      <DraftNotice form={form} draft={draft} />
      {isEnded(job) && <p className="muted">{t('onlyReference')}</p>}
      <div className="fields">
        <TextAreaField control={control} name="complaint" label={t('complaint')} />
        <TextField control={control} name="accessories" label={t('accessories')} optional />
        <SelectField control={control} name="contamination" label={t('contamination')} options={OPTIONS} />
        <TextField control={control} name="contaminationWords" label={t('contaminationWords')} optional />
        <TextField control={control} name="promisedOn" type="date" label={t('promisedOn')} optional />
        <TextField control={control} name="customerReference" label={t('customerReference')} optional />
      </div>
      {conflict ? (
        <ConflictNotice
          differences={differencesOf(conflict.form, getValues())}
          onTakeTheirs={() => {
            reset(conflict.form);
            setVersion(conflict.version);
            draft.forget();
            update.reset();
          }}
          onKeepMine={() => {
            setVersion(conflict.version);
            sendForm({ clearErrors, handleSubmit }, (values) => save(values, conflict.version));
          }}
        />
      ) : (
        <ErrorNotice error={unsaid(update.error, control)} />
      )}
      <div className="row">
        <Button type="submit" intent="primary" text={t('save')} loading={update.isPending} />
        <Button
          text={t('cancel')}
          onClick={() => {
            draft.forget();
            onDone();
          }}
        />
      </div>
    </form>
  );
}
