import { Button, Callout } from '@blueprintjs/core';
import { QueryClientContext } from '@tanstack/react-query';
import { useContext, useEffect, useRef, useState } from 'react';
import type { FieldValues, UseFormReturn } from 'react-hook-form';
import { useBlocker } from 'react-router-dom';
import { momentOf } from '../lib/format.js';
import { meQuery } from '../lib/me.js';
import { defineText } from '../lib/text.js';
import { ConfirmDialog } from './confirm-dialog.js';

const t = defineText({
  restored: 'Your draft of {when} is back.',
  older: 'There is a draft of {when}, from before the last change somebody saved.',
  take: 'Take the draft',
  discard: 'Start afresh',
  leave: 'Leave without saving?',
  leaveWords: 'The draft is kept on this device and comes back with the form.',
  go: 'Leave',
  stay: 'Stay here',
});

interface Kept {
  readonly at: string;
  readonly basis: string;
  readonly values: unknown;
}

function read(key: string): Kept | null {
  try {
    const text = localStorage.getItem(key);
    return text ? (JSON.parse(text) as Kept) : null;
  } catch {
    return null;
  }
}

export interface Draft {
  /** when a draft was brought back */
  readonly restoredAt: string | null;
  /** when a draft was made on an older version of the thing: offered, not taken by itself */
  readonly offeredAt: string | null;
  takeOffered(): void;
  /** forgets the draft: after saving, or to start afresh */
  forget(): void;
  /** true while something is typed that is not saved; asked at the moment of leaving, not of drawing */
  isDirty(): boolean;
  readonly dirty: boolean;
}

/**
 * Keeps what is typed on this device, through reload, crash and lost sign-in, until it is saved.
 * `draftKey` names the thing that is filled in: 'book-in', 'record:JOB:final-test'. Each person has drafts of their own.
 * `basis` is the version the form was filled from. Not for forms with passwords.
 */
export function useDraft<F extends FieldValues>(form: UseFormReturn<F>, draftKey: string, { basis = '' }: { readonly basis?: string | number } = {}): Draft {
  const who = useContext(QueryClientContext)?.getQueryData(meQuery.queryKey)?.id ?? 'anyone';
  const key = `loopbay.draft.${who}.${draftKey}`;
  const from = String(basis);
  const [found] = useState(() => read(key));
  const fits = found !== null && (found.basis ?? '') === from;
  const [restoredAt, setRestoredAt] = useState(fits ? found.at : null);
  const [offeredAt, setOfferedAt] = useState(found !== null && !fits ? found.at : null);
  const [dirty, setDirty] = useState(fits);
  // the blocker asks in the same breath in which a form says that it is saved: state would answer too late
  const dirtyNow = useRef(fits);
  const { reset, watch, getValues } = form;
  useEffect(() => {
    if (fits) reset({ ...getValues(), ...(found.values as F) }, { keepDefaultValues: true });
    const { unsubscribe } = watch((values, change) => {
      if (!change.name && change.type !== 'change') return;
      dirtyNow.current = true;
      setDirty(true);
      try {
        localStorage.setItem(key, JSON.stringify({ at: new Date().toISOString(), basis: from, values } satisfies Kept));
      } catch {
        // a full or forbidden storage only costs the draft
      }
    });
    return unsubscribe;
  }, [key, from, fits, found, reset, watch, getValues]);
  return {
    restoredAt,
    offeredAt,
    dirty,
    isDirty: () => dirtyNow.current,
    takeOffered() {
      if (!found) return;
      reset({ ...getValues(), ...(found.values as F) }, { keepDefaultValues: true });
      dirtyNow.current = true;
      setDirty(true);
      setRestoredAt(offeredAt);
      setOfferedAt(null);
    },
    forget() {
      localStorage.removeItem(key);
      dirtyNow.current = false;
      setRestoredAt(null);
      setOfferedAt(null);
      setDirty(false);
    },
  };
}

/** Asks before a form is left with changes, by a link, the back button or closing the page. */
export function LeaveWarning({ isDirty }: { readonly isDirty: () => boolean }) {
  const blocker = useBlocker(({ currentLocation, nextLocation }) => isDirty() && currentLocation.pathname !== nextLocation.pathname);
  useEffect(() => {
    const warn = (event: BeforeUnloadEvent) => {
      if (isDirty()) event.preventDefault();
    };
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [isDirty]);
  return (
    <ConfirmDialog open={blocker.state === 'blocked'} title={t('leave')} confirm={t('go')} cancel={t('stay')} onConfirm={() => blocker.proceed?.()} onClose={() => blocker.reset?.()}>
      <p>{t('leaveWords')}</p>
    </ConfirmDialog>
  );
}

/** Says that a draft came back, and asks before the form is left with changes. */
export function DraftNotice<F extends FieldValues>({ form, draft }: { readonly form: UseFormReturn<F>; readonly draft: Draft }) {
  const afresh = () => {
    form.reset(form.formState.defaultValues as F);
    draft.forget();
  };
  return (
    <>
      {draft.restoredAt && (
        <Callout className="row spread no-print" compact role="status">
          <span>{t('restored', { when: momentOf(draft.restoredAt) })}</span>
          <Button size="small" text={t('discard')} onClick={afresh} />
        </Callout>
      )}
      {draft.offeredAt && (
        <Callout className="row spread no-print" compact role="status" intent="warning">
          <span>{t('older', { when: momentOf(draft.offeredAt) })}</span>
          <span className="row">
            <Button size="small" text={t('take')} onClick={draft.takeOffered} />
            <Button size="small" text={t('discard')} onClick={draft.forget} />
          </span>
        </Callout>
      )}
      <LeaveWarning isDirty={draft.isDirty} />
    </>
  );
}
