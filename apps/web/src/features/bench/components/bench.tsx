import { Button, Callout } from '@blueprintjs/core';
import type { CoreTestReadings } from '@shared/core-tests';
import type { BayView } from '@shared/instruments';
import type { JobSheet } from '@shared/jobs';
import type { LimitsSet } from '@shared/limits';
import type { RecordView } from '@shared/records';
import { useMemo, useState } from 'react';
import { FormProvider, useForm, useWatch, type FieldPath } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { TextField } from '../../../components/fields.js';
import { ErrorNotice } from '../../../components/notices.js';
import { PageHeader } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { ApiError, newKey } from '../../../lib/http.js';
import { lastOfKind, readingsOf, useKeepRecord } from '../../../lib/job-records.js';
import { unsaid } from '../../../lib/unsaid.js';
import { beforeRecord, beforeTestOf, waiverInForce } from '../before-test.js';
import { afterFromBefore, benchFrom, blankBench, type BenchValues, type Phase } from '../bench-form.js';
import { liveTest, type LiveTest } from '../live-test.js';
import { t } from '../text.js';
import { BenchFoot } from './bench-foot.js';
import { BenchLive } from './bench-context.js';
import { BenchConflict } from './bench-conflict.js';
import { CoreColumn } from './core-column.js';
import { ReadingsColumn } from './readings-column.js';
import { SetupColumn } from './setup-column.js';
import { SpineRail } from './spine-rail.js';
import '../bench.css';

interface BenchProps {
  readonly job: JobSheet;
  readonly phase: Phase;
  readonly records: readonly RecordView[];
  readonly limits: LimitsSet;
  readonly bay: BayView;
  /** the kept test that is corrected, with a reason */
  readonly amend: RecordView | null;
  readonly onKept: (kept: RecordView, screenVerdict: string | null) => void;
}

const SERVER_PREFIX = 'record.readings.';

/** The core-test bench: size, set-up, readings and result in one screen, computed while they are typed. */
export function Bench({ job, phase, records, limits, bay, amend, onKept }: BenchProps) {
  const system = useUnits();
  const kind = `core-test-${phase}` as const;
  const beforeKept = phase === 'after' ? beforeRecord(records) : undefined;
  const before = useMemo(() => (beforeKept ? beforeTestOf(beforeKept) : null), [beforeKept]);
  const waived = phase === 'after' && !before && waiverInForce(job);

  const form = useForm<BenchValues>({ defaultValues: startOf() });
  const draft = useDraft(form, `record:${job.id}:${kind}:${amend ? `amend-${amend.id}` : 'new'}`, { basis: amend ? amend.version : (beforeKept?.revision ?? 0) });
  const values = useWatch({ control: form.control }) as BenchValues;
  const [ampsRising, setAmpsRising] = useState(false);
  const [tried, setTried] = useState(false);
  const [key] = useState(newKey);
  const [version, setVersion] = useState(amend?.version ?? 0);
  const keep = useKeepRecord(job.id, key);
  const context = { phase, limits: limits.core, before: before ?? (waived ? ('waived' as const) : undefined), ampsRising };
  const live = liveTest(values, context);

  function startOf(): BenchValues {
    if (amend) return benchFrom(readingsOf(amend, kind), system);
    const earlier = beforeKept ?? lastOfKind(records, kind);
    if (earlier) return afterFromBefore(readingsOf(earlier, 'core-test-before'), system);
    const dismantling = lastOfKind(records, 'dismantling');
    const supply = bay.supplies[0];
    return blankBench(system, job.machine.coreGeometry, {
      ...(supply ? { frequencyHz: supply.frequencyHz } : {}),
      ...(dismantling ? { frameMaterial: readingsOf(dismantling, 'dismantling').frameMaterial } : {}),
    });
  }

  const missing = useMemo(() => new Map(tried ? [...live.problems].reverse().map((p) => [p.path, p.message]) : []), [tried, live.problems]);

  const save = (as = version) => {
    const now = liveTest(form.getValues(), context);
    const [first] = now.problems;
    const why = form.getValues('why').trim();
    setTried(true);
    form.clearErrors();
    if (first) return form.setFocus(first.path as FieldPath<BenchValues>);
    if (amend && why === '') return form.setError('why', { message: t('why') }, { shouldFocus: true });
    keep.mutate(
      { record: { kind, readings: now.readings, entered: now.entered }, correction: amend ? { recordId: amend.id, version: as, reason: why } : null },
      {
        onSuccess: (kept) => {
          draft.forget();
          onKept(kept, now.result?.verdict ?? null);
        },
        onError: (error) => {
          if (!(error instanceof ApiError)) return;
          for (const { path, message } of error.fields) form.setError(path.replace(SERVER_PREFIX, '') as FieldPath<BenchValues>, { message });
        },
      },
    );
  };

  const conflict = keep.error instanceof ApiError && keep.error.code === 'CHANGED_MEANWHILE' ? (keep.error.current as RecordView) : null;
  return (
    <FormProvider {...form}>
      <BenchLive.Provider value={{ wrong: live.wrong, missing, before: before?.input ? (readingsOf(beforeKept!, 'core-test-before') as CoreTestReadings) : null }}>
        <form
          className="lb-bench"
          noValidate
          onSubmit={(e) => {
            e.preventDefault();
            save();
          }}
        >
          <BenchHeader job={job} phase={phase} again={(lastOfKind(records, kind)?.ordinal ?? 0) + 1} amend={amend} pending={keep.isPending} />
          <Notices live={live} waived={waived} missingBefore={phase === 'after' && !before && !waived} job={job} />
          <DraftNotice form={form} draft={draft} />
          {conflict ? (
            <BenchConflict
              theirs={conflict}
              mine={live.readings}
              onTakeTheirs={() => {
                form.reset({ ...benchFrom(readingsOf(conflict, kind), system), why: form.getValues('why') });
                setVersion(conflict.version);
                keep.reset();
              }}
              onKeepMine={() => {
                setVersion(conflict.version);
                save(conflict.version);
              }}
            />
          ) : (
            <ErrorNotice error={unsaid(keep.error, form.control, (path) => path.replace(SERVER_PREFIX, ''))} />
          )}
          {amend && <TextField control={form.control} name="why" label={t('why')} help={t('whyHelp')} />}
          <div className="lb-bench-columns">
            <SpineRail job={job} />
            <CoreColumn live={live} />
            <SetupColumn live={live} bay={bay} minimumTargetT={limits.core.minimumTargetT} before={before ? { turns: before.input.reading.excitingTurns, result: before.result } : null} />
            <ReadingsColumn live={live} bay={bay} timerKey={`${job.id}.${kind}`} ampsRising={ampsRising} onAmpsRising={setAmpsRising} />
          </div>
          <BenchFoot live={live} phase={phase} limits={limits.core} before={before} />
        </form>
      </BenchLive.Provider>
    </FormProvider>
  );
}

function BenchHeader({ job, phase, again, amend, pending }: { readonly job: JobSheet; readonly phase: Phase; readonly again: number; readonly amend: RecordView | null; readonly pending: boolean }) {
  const title = t(phase === 'before' ? 'titleBefore' : 'titleAfter');
  return (
    <PageHeader
      title={`${title} · ${job.number}`}
      below={
        <>
          {job.machine.description} · {job.customer.name} · <Link to={`/jobs/${job.id}`}>{t('toJob', { number: job.number })}</Link>
          {phase === 'before' && !amend && (
            <>
              {' · '}
              <Link to={`/jobs/${job.id}?step=core-test-before#work`}>{t('cannotTest')}</Link>
            </>
          )}
          {amend ? ` · ${t('correcting', { revision: amend.revision })}` : again > 1 ? ` · ${t('again', { n: again })}` : ''}
        </>
      }
      actions={<Button type="submit" className="lb-bench-big" intent="primary" loading={pending} text={t(amend ? 'saveCorrection' : 'save')} />}
    />
  );
}

/** What must be seen before anything else: switch off, or what this test lacks. */
function Notices({ live, waived, missingBefore, job }: { readonly live: LiveTest; readonly waived: boolean; readonly missingBefore: boolean; readonly job: JobSheet }) {
  return (
    <>
      {live.stop.length > 0 && (
        <div className="lb-bench-stop" role="alert">
          {live.stop.map((r) => (
            <b key={r.code}>{r.words}</b>
          ))}
        </div>
      )}
      {waived && <Callout compact>{t('waived')}</Callout>}
      {missingBefore && (
        <Callout compact intent="warning">
          <b>{t('noBefore')}</b> {t('noBeforeWords')} <Link to={`/jobs/${job.id}?step=core-test-before#work`}>{t('askWaiver')}</Link>
        </Callout>
      )}
    </>
  );
}
