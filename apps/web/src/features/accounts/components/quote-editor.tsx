import { Button } from '@blueprintjs/core';
import { saveQuoteSchema, quoteViewSchema, type QuoteView } from '@shared/quotes';
import { useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { TextAreaField, TextField } from '../../../components/fields.js';
import { Notice } from '../../../components/notice.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { problemsOf, showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { sendForm } from '../../../lib/send-form.js';
import { quoteDifferences } from '../quote-conflict.js';
import { formOf, readQuote, type QuoteForm } from '../quote-form.js';
import { t } from '../quote-text.js';
import { QuoteLines } from './quote-lines.js';
import { QuoteSums } from './quote-sums.js';
import './quote-editor.css';

export type QuoteInput = ReturnType<typeof saveQuoteSchema.parse>;

interface QuoteEditorProps {
  /** the quote that is changed; null for a new one */
  readonly quote: QuoteView | null;
  readonly start: QuoteForm;
  readonly currency: string;
  readonly draftKey: string;
  readonly pending: boolean;
  readonly error: unknown;
  readonly onSave: (input: QuoteInput, version: number, done: { onSuccess: (saved: QuoteView) => void; onError: (error: unknown) => void }) => void;
  readonly onSaved: (saved: QuoteView) => void;
  /** the quote as it stands now is not a draft: it is shown instead */
  readonly onGone?: (theirs: QuoteView) => void;
  readonly actions?: (unsaved: boolean) => ReactNode;
}

/** The quote somebody else saved meanwhile, when that is why it was refused. */
function theirsOf(error: unknown): QuoteView | null {
  if (!(error instanceof ApiError) || error.code !== 'CHANGED_MEANWHILE') return null;
  const theirs = quoteViewSchema.safeParse(error.current);
  return theirs.success ? theirs.data : null;
}

/** A quote while it is a draft: lines, last day, note; sums as they are typed. */
export function QuoteEditor({ quote, start, currency, draftKey, pending, error, onSave, onSaved, onGone, actions }: QuoteEditorProps) {
  // what the form was filled from: a newer one that arrives meanwhile is a conflict when it is saved, not a new form
  const [version, setVersion] = useState(quote?.version ?? 0);
  const [settled, setSettled] = useState<unknown>(null);
  const form = useForm<QuoteForm>({ defaultValues: start });
  const { control, setError, reset, getValues } = form;
  const draft = useDraft(form, draftKey, { basis: version });
  const said = useRef<HTMLDivElement>(null);
  useEffect(() => {
    // the button is always in sight, what it led to would not be
    if (error && error !== settled) said.current?.scrollIntoView?.({ block: 'center' });
  }, [error, settled]);
  const theirs = useMemo(() => (error === settled ? null : theirsOf(error)), [error, settled]);

  const send = (values: QuoteForm, asOf: number) => {
    const { candidate, problems } = readQuote(values, currency);
    const input = saveQuoteSchema.safeParse(candidate);
    if (problems.length > 0 || !input.success) return showProblems([...problems, ...(input.success ? [] : problemsOf(input.error))], setError);
    onSave(input.data, asOf, {
      onSuccess: (saved) => {
        draft.forget();
        setVersion(saved.version);
        reset(formOf(saved));
        onSaved(saved);
      },
      onError: (failed) => showServerProblems(failed, setError),
    });
  };
  const takeTheirs = () => {
    if (!theirs) return;
    draft.forget();
    setVersion(theirs.version);
    reset(formOf(theirs));
    setSettled(error);
  };
  const gone = theirs && theirs.state !== 'draft';
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        sendForm(form, (values) => send(values, version));
      }}
    >
      <DraftNotice form={form} draft={draft} />
      <Panel title={t('lines')}>
        <div className="stack">
          <QuoteLines control={control} currency={currency} />
          <QuoteSums control={control} currency={currency} />
        </div>
      </Panel>
      <Panel>
        <div className="fields">
          <TextField control={control} name="validUntil" type="date" label={t('validUntil')} />
          <TextAreaField control={control} name="note" label={t('note')} help={t('noteHelp')} optional />
        </div>
      </Panel>
      <div ref={said} className="lb-quote-said">
        {gone ? (
          <Notice intent="warning" role="alert" title={t('gone')}>
            <div className="stack">
              <p>{t('goneWords')}</p>
              <div>
                <Button text={t('see')} onClick={() => onGone?.(theirs)} />
              </div>
            </div>
          </Notice>
        ) : theirs ? (
          <ConflictNotice differences={quoteDifferences(theirs, getValues())} onTakeTheirs={takeTheirs} onKeepMine={() => sendForm(form, (values) => send(values, theirs.version))} />
        ) : (
          error !== settled && <ErrorNotice error={error} />
        )}
      </div>
      <div className="row lb-quote-foot">
        <Button type="submit" intent={quote && !draft.dirty ? 'none' : 'primary'} text={t('save')} loading={pending} />
        {actions?.(draft.dirty)}
        {quote && draft.dirty && <span className="muted">{t('unsaved')}</span>}
      </div>
    </form>
  );
}
