import { Button } from '@blueprintjs/core';
import { limitDifferences } from '@shared/limit-differences';
import { LIMIT_ROWS } from '@shared/limit-rows';
import { ruleOf } from '@shared/limit-values';
import { limitsVersionViewSchema, type LimitsVersionView, type PublishLimits } from '@shared/limits';
import { useMemo, useState } from 'react';
import { useForm, useWatch, type Control } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { TextAreaField } from '../../../components/fields.js';
import { IntoView } from '../../../components/into-view.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { usePublishLimits } from '../api/limits-queries.js';
import { limitFormOf, onTopOf, readLimits, readSet, type LimitForm } from '../limit-form.js';
import { LIMIT_SECTIONS } from '../limit-sections.js';
import { t } from '../text.js';
import { changedFigures, LimitBlockFields } from './limit-block.js';
import { conflictLines, PublishDialog } from './publish-dialog.js';
import { RuleField } from './rule-field.js';
import './limits.css';

interface EditorProps {
  /** every version, the newest first */
  readonly versions: readonly LimitsVersionView[];
  readonly onPublished: (version: LimitsVersionView) => void;
  readonly onCancel: () => void;
}

const publishedMeanwhile = (error: unknown): LimitsVersionView | null => {
  if (!(error instanceof ApiError) || error.code !== 'CHANGED_MEANWHILE') return null;
  const theirs = limitsVersionViewSchema.safeParse(error.current);
  return theirs.success ? theirs.data : null;
};

/** A new version, begun with the one in force; published after everything that changes was looked through. */
export function LimitsEditor({ versions, onPublished, onCancel }: EditorProps) {
  const units = useUnits();
  const publish = usePublishLimits();
  const [told, setTold] = useState<LimitsVersionView | null>(null);
  // a version told of by a refusal may be newer than the list
  const newest = told && told.version > versions[0]!.version ? told : versions[0]!;
  const form = useForm<LimitForm>({ defaultValues: useMemo(() => limitFormOf(versions[0]!, units), [versions, units]) });
  const { control, getValues, reset, setError, clearErrors } = form;
  const draft = useDraft(form, 'limits');
  const [ready, setReady] = useState<PublishLimits | null>(null);
  const [wrong, setWrong] = useState(0);
  const [nothing, setNothing] = useState(false);
  const baseVersion = useWatch({ control, name: 'baseVersion' });
  // a draft brings its own base; what was published meanwhile is a conflict, not a new beginning
  const base = [newest, ...versions].find((v) => v.version === baseVersion) ?? newest;
  const behind = base.version !== newest.version;
  const merged = behind ? onTopOf(getValues(), base, newest, units) : null;

  const review = (values: LimitForm, on: LimitsVersionView) => {
    clearErrors();
    publish.reset();
    const { input, problems } = readLimits(values, on, { lookAtSource: t('stillStandsHelp') });
    setWrong(problems.length);
    const unchanged = input !== null && limitDifferences(on.set, input.set).length === 0;
    setNothing(unchanged);
    if (problems.length > 0) return showProblems(problems, setError);
    if (!unchanged) setReady(input);
  };
  const onTheirs = () => {
    const mine = onTopOf(getValues(), base, newest, units);
    // kept as typed: the draft goes on from here
    reset(mine, { keepDefaultValues: true });
    form.setValue('baseVersion', newest.version, { shouldDirty: true });
    publish.reset();
    review(mine, newest);
  };
  const takeTheirs = () => {
    draft.forget();
    reset(limitFormOf(newest, units));
    publish.reset();
  };
  const send = () => {
    if (!ready) return;
    publish.mutate(ready, {
      onSuccess: (version) => {
        draft.forget();
        setReady(null);
        onPublished(version);
      },
      onError: (error) => {
        setTold(publishedMeanwhile(error));
        const atFields = error instanceof ApiError && error.fields.length > 0;
        if (atFields) setWrong(error.fields.length);
        // what cannot be settled in the dialog is settled behind it
        if (atFields || (error instanceof ApiError && error.code === 'CHANGED_MEANWHILE')) setReady(null);
        showServerProblems(error, setError);
      },
    });
  };
  return (
    <form
      className="stack lb-limits-form"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        review(getValues(), base);
      }}
    >
      <DraftNotice form={form} draft={draft} />
      {merged && (
        <IntoView>
          <p className="muted">{t('theirsMeanwhile', { version: newest.version, who: newest.publishedBy, note: newest.note })}</p>
          <ConflictNotice differences={conflictLines(limitDifferences(newest.set, readSet(merged, newest.set)), units)} onTakeTheirs={takeTheirs} onKeepMine={onTheirs} />
        </IntoView>
      )}
      {LIMIT_SECTIONS.map((section) => (
        <Panel key={section.key} title={section.title}>
          {section.blocks.map((block) => (
            <LimitBlockFields key={`${base.version}:${block.key}`} control={control} block={block} base={base} headed={section.key === 'core'} />
          ))}
          {section.withRule && <RuleField control={control} before={ruleOf(base.set)} />}
        </Panel>
      ))}
      <Panel title={t('noteTitle')}>
        <TextAreaField control={control} name="note" label={t('noteLabel')} help={t('noteHelp')} />
      </Panel>
      <Foot control={control} base={base} wrong={wrong} nothing={nothing} error={ready || behind ? null : publish.error} onCancel={onCancel} />
      <PublishDialog
        open={ready !== null}
        version={base.version + 1}
        note={ready?.note ?? ''}
        differences={ready ? limitDifferences(base.set, ready.set) : []}
        pending={publish.isPending}
        error={publish.error}
        onPublish={send}
        onClose={() => setReady(null)}
      />
    </form>
  );
}

interface FootProps {
  readonly control: Control<LimitForm>;
  readonly base: LimitsVersionView;
  readonly wrong: number;
  readonly nothing: boolean;
  readonly error: unknown;
  readonly onCancel: () => void;
}

/** What was changed so far, and the way on; in sight wherever one is on the page. */
function Foot({ control, base, wrong, nothing, error, onCancel }: FootProps) {
  const values = useWatch({ control }) as LimitForm;
  const rule = (values.set['core'] as { decisionRule?: string } | undefined)?.decisionRule;
  const count = changedFigures(values, LIMIT_ROWS, base.set) + Number(rule !== ruleOf(base.set));
  return (
    <div className="lb-limits-foot stack">
      <ErrorNotice error={error} />
      <div className="row spread">
        <span role="status">
          {count === 0 ? t('countNone') : t('count', { count })}
          {nothing && <span className="lb-problem"> {t('nothing')}</span>}
          {wrong > 0 && <span className="lb-problem"> {t('seeFields', { count: wrong })}</span>}
        </span>
        <div className="row">
          <Button text={t('cancel')} onClick={onCancel} />
          <Button type="submit" intent="primary" text={t('review')} />
        </div>
      </div>
    </div>
  );
}
