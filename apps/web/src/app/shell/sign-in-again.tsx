import { Dialog, DialogBody } from '@blueprintjs/core';
import { useEffect, useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { onSessionEnded } from '../../lib/http.js';
import { useMe } from '../../lib/me.js';
import { SignInForm } from './sign-in-form.js';
import { t } from './text.js';

/** A session that ends in the middle of a form is taken up again over the form, which stays as it is. */
export function SignInAgain() {
  const me = useMe();
  const client = useQueryClient();
  const [open, setOpen] = useState(false);
  useEffect(() => onSessionEnded(() => setOpen(true)), []);
  return (
    <Dialog isOpen={open} title={t('againTitle')} isCloseButtonShown={false} canOutsideClickClose={false} canEscapeKeyClose={false}>
      <DialogBody>
        <div className="stack">
          <p>{t('againWords')}</p>
          <SignInForm
            email={me.email}
            onDone={() => {
              setOpen(false);
              void client.invalidateQueries();
            }}
          />
        </div>
      </DialogBody>
    </Dialog>
  );
}
