import { Button, Callout } from '@blueprintjs/core';
import { useEffect, useRef, useState } from 'react';
import type { FieldValues, UseFormReturn } from 'react-hook-form';
import { useBlocker } from 'react-router-dom';
import { momentOf } from '../lib/format.js';
import { defineText } from '../lib/text.js';
import { ConfirmDialog } from './confirm-dialog.js';

const t = defineText({
  restored: 'Your draft of {when} is back.',
  discard: 'Start afresh',
  leave: 'Leave without saving?',
  leaveWords: 'The draft is kept on this device and comes back with the form.',
  go: 'Leave',
});

interface Kept {
  readonly at: string;
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
  /** forgets the draft: after saving, or to start afresh */
  forget(): void;
  readonly dirty: boolean;
}

/**
 * Keeps what is typed on this device, through reload, crash and lost sign-in, until it is saved.
 * `draftKey` names the thing that is filled in: 'book-in', 'record:JOB:final-test'.
 */
export function useDraft<F extends FieldValues>(form: UseFormReturn<F>, draftKey: string): Draft {
  const key = `loopbay.draft.${draftKey}`;
  const [restoredAt, setRestoredAt] = useState<string | null>(null);
  const [dirty, setDirty] = useState(false);
  const blank = useRef<F | null>(null);
  const { reset, watch, getValues } = form;
  useEffect(() => {
    blank.current = structuredClone(getValues());
    const kept = read(key);
    if (kept) {
      reset(kept.values as F, { keepDefaultValues: true });
      setRestoredAt(kept.at);
      setDirty(true);
    }
    const { unsubscribe } = watch((values, change) => {
      if (!change.name && change.type !== 'change') return;
      setDirty(true);
      try {
        localStorage.setItem(key, JSON.stringify({ at: new Date().toISOString(), values }));
      } catch {
        // a full or forbidden storage only costs the draft
      }
    });
    return unsubscribe;
  }, [key, reset, watch, getValues]);
  return {
    restoredAt,
    dirty,
    forget() {
      localStorage.removeItem(key);
      setRestoredAt(null);
      setDirty(false);
    },
  };
}

/** Says that a draft came back, and asks before the form is left with changes. */
export function DraftNotice<F extends FieldValues>({ form, draft }: { readonly form: UseFormReturn<F>; readonly draft: Draft }) {
  const blocker = useBlocker(({ currentLocation, nextLocation }) => draft.dirty && currentLocation.pathname !== nextLocation.pathname);
  useEffect(() => {
    if (!draft.dirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [draft.dirty]);
  return (
    <>
      {draft.restoredAt && (
        <Callout className="row spread" compact>
          <span>{t('restored', { when: momentOf(draft.restoredAt) })}</span>
          <Button
            size="small"
            text={t('discard')}
            onClick={() => {
              draft.forget();
              form.reset(form.formState.defaultValues as F);
            }}
          />
        </Callout>
      )}
      <ConfirmDialog open={blocker.state === 'blocked'} title={t('leave')} confirm={t('go')} onConfirm={() => blocker.proceed?.()} onClose={() => blocker.reset?.()}>
        <p>{t('leaveWords')}</p>
      </ConfirmDialog>
    </>
  );
}
