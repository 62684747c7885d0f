import { Button } from '@blueprintjs/core';
import { toNestErrors } from '@hookform/resolvers';
import type { ReadingsOf, RecordView } from '@shared/records';
import { useState, type ComponentType } from 'react';
import { FormProvider, useForm, useWatch, type FieldErrors, type FieldPath, type FieldValues, type Resolver } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { TextField } from '../../../components/fields.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { PageHeader } from '../../../components/panel.js';
import { ApiError, newKey } from '../../../lib/http.js';
import { readingsOf, recordsOfKind, useKeepRecord } from '../../../lib/job-records.js';
import { recordName } from '../../../lib/record-names.js';
import { unsaid } from '../../../lib/unsaid.js';
import { changesBetween } from '../reading-words.js';
import { problemsIn, type FormKind, type RecordContext, type RecordDefinition } from '../record-definition.js';
import { t } from '../text.js';
import '../records.css';

export interface FieldsProps<K extends FormKind> {
  readonly context: RecordContext;
  /** as far as they are typed: NaN where a figure is missing */
  readonly readings: ReadingsOf<K>;
}

interface RecordFormProps<K extends FormKind, V extends object> {
  readonly definition: RecordDefinition<K, V>;
  readonly Fields: ComponentType<FieldsProps<K>>;
  readonly context: RecordContext;
  readonly amend: RecordView | null;
  readonly onKept: (kept: RecordView) => void;
}

const SERVER_PREFIX = /^record\.(readings\.)?/;

/** The record's own values: the reason of a correction stands beside them. */
function typedIn<V>({ why: _why, ...values }: FieldValues): V {
  return values as V;
}

/** One record of a job: typed, kept as a draft, checked as the server checks, saved as a record or as a correction. */
export function RecordForm<K extends FormKind, V extends object>({ definition, Fields, context, amend, onKept }: RecordFormProps<K, V>) {
  const { job, records, system } = context;
  const { kind } = definition;
  const [key] = useState(newKey);
  const [version, setVersion] = useState(amend?.version ?? 0);
  const keep = useKeepRecord(job.id, key);

  const resolver: Resolver<FieldValues> = (values, _, options) => {
    const problems = problemsIn(definition, definition.read(typedIn<V>(values)), context);
    if (amend && String(values['why'] ?? '').trim() === '') problems.push({ path: 'why', message: t('whyEmpty') });
    const errors = Object.fromEntries(problems.map(({ path, message }) => [path, { type: 'reading', message }])) as FieldErrors;
    return problems.length === 0 ? { values, errors: {} } : { values: {}, errors: toNestErrors(errors, options) };
  };
  const form = useForm<FieldValues>({
    defaultValues: { ...(amend ? definition.from(readingsOf(amend, kind), system) : definition.start(context)), why: '' },
    resolver,
    mode: 'onTouched',
  });
  const draft = useDraft(form, `record:${job.id}:${kind}:${amend ? `amend-${amend.id}` : 'new'}`, { basis: version });
  const filled = definition.read(typedIn<V>(useWatch({ control: form.control })));

  const send = (as: number) => {
    const values = form.getValues();
    const { readings, entered } = definition.read(typedIn<V>(values));
    keep.mutate(
      { record: { kind, readings, entered }, correction: amend ? { recordId: amend.id, version: as, reason: String(values['why']).trim() } : null },
      {
        onSuccess: (kept) => {
          draft.forget();
          onKept(kept);
        },
        onError: (error) => {
          if (!(error instanceof ApiError)) return;
          for (const { path, message } of error.fields) form.setError(path.replace(SERVER_PREFIX, '') as FieldPath<FieldValues>, { type: 'server', message });
        },
      },
    );
  };

  const conflict = keep.error instanceof ApiError && keep.error.code === 'CHANGED_MEANWHILE' ? (keep.error.current as RecordView) : null;
  const again = recordsOfKind(records, kind).length + 1;
  return (
    <FormProvider {...form}>
      <form className="lb-record" noValidate onSubmit={(e) => void form.handleSubmit(() => send(version))(e)}>
        <PageHeader
          title={`${recordName(kind)} · ${job.number}`}
          below={
            <>
              {job.machine.description} · {job.customer.name} · <Link to={`/jobs/${job.id}`}>{t('toJob', { number: job.number })}</Link>
              {amend ? ` · ${t('correcting', { revision: amend.revision })}` : again > 1 ? ` · ${t('again', { n: again })}` : ''}
            </>
          }
          actions={<Button type="submit" intent="primary" className="lb-record-big" loading={keep.isPending} text={t(amend ? 'saveCorrection' : 'save')} />}
        />
        <div className="stack">
          <DraftNotice form={form} draft={draft} />
          {conflict ? (
            <ConflictNotice
              differences={changesBetween(conflict.readings, filled.readings as Record<string, unknown>, system).map((c) => ({ label: c.label, theirs: c.was, yours: c.is }))}
              onTakeTheirs={() => {
                form.reset({ ...definition.from(readingsOf(conflict, kind), system), why: form.getValues('why') as string });
                setVersion(conflict.version);
                keep.reset();
              }}
              onKeepMine={() => {
                setVersion(conflict.version);
                send(conflict.version);
              }}
            />
          ) : (
            <ErrorNotice error={unsaid(keep.error, form.control, (path) => path.replace(SERVER_PREFIX, ''))} />
          )}
          {amend && <TextField control={form.control} name="why" label={t('why')} help={t('whyHelp')} />}
          <Fields context={context} readings={filled.readings} />
        </div>
      </form>
    </FormProvider>
  );
}
