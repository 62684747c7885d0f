import { TextArea } from '@blueprintjs/core';
import { useState, type ReactNode } from 'react';
import { Field } from '../../../components/field.js';
import { SignDialog } from '../../../components/sign-dialog.js';
import { ApiError } from '../../../lib/http.js';

interface SignWithReasonProps {
  readonly title: string;
  readonly label: string;
  /** said when the reason is missing; without it the reason may be left out */
  readonly emptyWords?: string;
  readonly children?: ReactNode;
  readonly pending: boolean;
  readonly error: unknown;
  readonly onSign: (reason: string, password: string) => void;
  readonly onClose: () => void;
}

/** A signature with words of the one who signs. */
export function SignWithReason({ title, label, emptyWords, children, pending, error, onSign, onClose }: SignWithReasonProps) {
  const [reason, setReason] = useState('');
  const [asked, setAsked] = useState(false);
  const ofReason = (path: string) => path === 'reason' || path === 'remark';
  const onlyOfReason = error instanceof ApiError && error.fields.length > 0 && error.fields.every((f) => ofReason(f.path));
  const fromServer = error instanceof ApiError ? error.fields.find((f) => ofReason(f.path))?.message : undefined;
  const problem = fromServer ?? (asked && emptyWords !== undefined && reason.trim() === '' ? emptyWords : undefined);
  return (
    <SignDialog
      open
      title={title}
      pending={pending}
      error={onlyOfReason ? null : error}
      onClose={onClose}
      onSign={(password) => {
        setAsked(true);
        if (emptyWords === undefined || reason.trim() !== '') onSign(reason.trim(), password);
      }}
    >
      {children}
      <Field label={label} optional={emptyWords === undefined} problem={problem}>
        {({ id, describedBy, invalid }) => <TextArea id={id} fill rows={2} value={reason} onChange={(e) => setReason(e.target.value)} aria-describedby={describedBy} aria-invalid={invalid} />}
      </Field>
    </SignDialog>
  );
}
