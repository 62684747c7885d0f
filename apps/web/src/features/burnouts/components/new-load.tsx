import { Button } from '@blueprintjs/core';
import { createLoadSchema, type LoadView, type WaitingJob } from '@shared/burnouts';
import type { BayView } from '@shared/instruments';
import { useState } from 'react';
import { FormProvider, useForm, useWatch } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { CheckField, SelectField, TextAreaField, TextField } from '../../../components/fields.js';
import { ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { problemsOf, showProblems } from '../../../lib/form-problems.js';
import { ApiError, newKey } from '../../../lib/http.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useCreateLoad } from '../api/load-queries.js';
import { atTheirTicks, chosenJobs, emptyLoad, formLimit, readLoad, type LoadValues } from '../load-form.js';
import { celsiusWords, limitReasonWords } from '../load-words.js';
import { t } from '../text.js';
import { JobChoice } from './job-choice.js';
import '../burnouts.css';

interface NewLoadProps {
  readonly waiting: readonly WaitingJob[];
  readonly ovens: BayView['ovens'];
  readonly today: string;
  readonly onKept: (load: LoadView) => void;
}

/** What goes into the oven together, said before it is lit. */
export function NewLoad({ waiting, ovens, today, onKept }: NewLoadProps) {
  const [key] = useState(newKey);
  const create = useCreateLoad(key);
  const form = useForm<LoadValues>({ defaultValues: emptyLoad(today) });
  const draft = useDraft(form, 'burnout:new');
  const { control, setError } = form;
  const chosen = useWatch({ control, name: 'chosen' });
  const send = (values: LoadValues) => {
    const candidate = readLoad(values, waiting);
    const sent = candidate.jobs as readonly { readonly jobId: string }[];
    const input = createLoadSchema.safeParse(candidate);
    if (!input.success) return showProblems(atTheirTicks(problemsOf(input.error), sent), setError);
    create.mutate(input.data, {
      onSuccess: (load) => {
        draft.forget();
        onKept(load);
      },
      onError: (error) => {
        if (error instanceof ApiError) showProblems(atTheirTicks(error.fields, sent), setError);
      },
    });
  };
  return (
    <FormProvider {...form}>
      <form
        noValidate
        className="stack"
        onSubmit={(e) => {
          e.preventDefault();
          sendForm(form, send);
        }}
      >
        <DraftNotice form={form} draft={draft} />
        <div className="two-columns">
          <Panel>
            <div className="stack">
              <div className="fields">
                <SelectField control={control} name="ovenId" label={t('oven')} ask={t('ovenAsk')} options={ovens.map((o) => ({ value: o.id, label: o.remark ? `${o.name}: ${o.remark}` : o.name }))} help={ovens.length === 0 ? t('noOvens') : undefined} />
                <TextField control={control} name="day" type="date" label={t('day')} />
              </div>
              <JobChoice waiting={waiting} />
              <CheckField control={control} name="countedAndSampled" label={t('counted')} help={t('countedHelp')} />
              <TextAreaField control={control} name="remark" label={t('remark')} help={t('remarkHelp')} optional rows={2} />
              <ErrorNotice error={unsaid(create.error)} />
              <div className="row">
                <Button type="submit" intent="primary" className="lb-load-big" loading={create.isPending} text={t('save')} />
              </div>
            </div>
          </Panel>
          <LimitPanel jobs={chosenJobs({ chosen }, waiting)} />
        </div>
      </form>
    </FormProvider>
  );
}

function LimitPanel({ jobs }: { readonly jobs: readonly WaitingJob[] }) {
  const system = useUnits();
  const limit = formLimit(jobs);
  return (
    <Panel title={limit ? t('limitNow', { limit: celsiusWords(limit.limitC, system) }) : t('limitNone')}>
      <div className="stack" aria-live="polite">
        {limit ? (
          <>
            <p>{t('setBy', { number: limit.number, reason: limitReasonWords(limit.limitReason) })}</p>
            <p className="muted">{t('forLoad')}</p>
          </>
        ) : (
          <p className="muted">{t('limitNoneWords')}</p>
        )}
      </div>
    </Panel>
  );
}
