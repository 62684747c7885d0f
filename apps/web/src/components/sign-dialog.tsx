import { Button, Dialog, DialogBody, DialogFooter, InputGroup } from '@blueprintjs/core';
import { useState, type ReactNode } from 'react';
import { ApiError } from '../lib/http.js';
import { defineText } from '../lib/text.js';
import { Field } from './field.js';
import { ErrorNotice } from './notices.js';

const t = defineText({ password: 'Your own password', why: 'You sign with your own password, typed now: tablets are shared.', sign: 'Sign', cancel: 'Not now', empty: 'Type your password to sign.' });

interface SignDialogProps {
  readonly open: boolean;
  readonly title: string;
  readonly children?: ReactNode;
  readonly pending: boolean;
  readonly error: unknown;
  readonly onSign: (password: string) => void;
  readonly onClose: () => void;
}

/** A signature: what is signed, in words, and the person's own password. */
export function SignDialog({ open, title, children, pending, error, onSign, onClose }: SignDialogProps) {
  const [password, setPassword] = useState('');
  const [asked, setAsked] = useState(false);
  const field = error instanceof ApiError ? error.fields.find((f) => f.path === 'password')?.message : undefined;
  const problem = field ?? (asked && password === '' ? t('empty') : undefined);
  const close = () => {
    setPassword('');
    setAsked(false);
    onClose();
  };
  return (
    <Dialog isOpen={open} onClose={close} title={title} onClosed={() => setPassword('')}>
      <form
        noValidate
        onSubmit={(e) => {
          e.preventDefault();
          // the form behind the dialog is not what was answered
          e.stopPropagation();
          setAsked(true);
          if (password !== '') onSign(password);
        }}
      >
        <DialogBody>
          <div className="stack">
            {children}
            <Field label={t('password')} help={t('why')} problem={problem}>
              {({ id, describedBy, invalid }) => (
                <InputGroup id={id} type="password" autoComplete="current-password" value={password} onChange={(e) => setPassword(e.target.value)} aria-describedby={describedBy} aria-invalid={invalid} autoFocus />
              )}
            </Field>
            {!field && <ErrorNotice error={error} />}
          </div>
        </DialogBody>
        <DialogFooter
          actions={
            <>
              <Button text={t('cancel')} onClick={close} />
              <Button type="submit" intent="primary" text={t('sign')} loading={pending} />
            </>
          }
        />
      </form>
    </Dialog>
  );
}
