import { Button, Dialog, DialogBody, DialogFooter } from '@blueprintjs/core';
import type { ReactNode } from 'react';
import { defineText } from '../lib/text.js';
import { ErrorNotice } from './notices.js';

const t = defineText({ cancel: 'Not now' });

interface ConfirmDialogProps {
  readonly open: boolean;
  readonly title: string;
  readonly confirm: string;
  /** the way back; 'Not now' unless told */
  readonly cancel?: string;
  readonly pending?: boolean;
  readonly error?: unknown;
  /** for a table of what changes */
  readonly wide?: boolean;
  readonly onConfirm: () => void;
  readonly onClose: () => void;
  readonly children?: ReactNode;
}

/** Asked before something that cannot be taken back, or that needs a word with it. */
export function ConfirmDialog({ open, title, confirm, cancel = t('cancel'), pending, error, wide = false, onConfirm, onClose, children }: ConfirmDialogProps) {
  return (
    <Dialog isOpen={open} onClose={onClose} title={title} style={wide ? { width: 'min(860px, 94vw)' } : undefined}>
      <form
        noValidate
        onSubmit={(e) => {
          e.preventDefault();
          // the form behind the dialog is not what was answered
          e.stopPropagation();
          onConfirm();
        }}
      >
        <DialogBody>
          <div className="stack">
            {children}
            <ErrorNotice error={error} />
          </div>
        </DialogBody>
        <DialogFooter
          actions={
            <>
              <Button text={cancel} onClick={onClose} />
              <Button type="submit" intent="primary" text={confirm} loading={pending} />
            </>
          }
        />
      </form>
    </Dialog>
  );
}
