import { Dialog, DialogBody } from '@blueprintjs/core';
import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { onSessionEnded } from '../../lib/http.js';
import { useMe } from '../../lib/me.js';
import { SignInForm } from './sign-in-form.js';
import { t } from './text.js';

/** A session that ends in the middle of a form is taken up again over the form; what was about to be saved is then saved. */
export function SignInAgain() {
  const me = useMe();
  const client = useQueryClient();
  const [open, setOpen] = useState(false);
  const waiting = useRef<((signedIn: boolean) => void) | null>(null);
  useEffect(
    () =>
      onSessionEnded(
        () =>
          new Promise((resolve) => {
            waiting.current = resolve;
            setOpen(true);
          }),
      ),
    [],
  );
  return (
    <Dialog isOpen={open} title={t('againTitle')} isCloseButtonShown={false} canOutsideClickClose={false} canEscapeKeyClose={false}>
      <DialogBody>
        <div className="stack">
          <p>{t('againWords')}</p>
          <SignInForm
            email={me.email}
            onDone={(now) => {
              // somebody else takes over the tablet: nothing of the one before may stay on the screen
              if (now.id !== me.id) return window.location.assign('/');
              setOpen(false);
              waiting.current?.(true);
              void client.invalidateQueries();
            }}
          />
        </div>
      </DialogBody>
    </Dialog>
  );
}
