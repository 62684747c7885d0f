import { Button, Dialog, DialogBody, DialogFooter } from '@blueprintjs/core';
import { updateUserSchema, type UserView } from '@shared/session';
import { useMemo, useState } from 'react';
import { useForm } from 'react-hook-form';
import { CheckField, TextField } from '../../../components/fields.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { useTell } from '../../../components/toaster.js';
import { problemsOf, showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useUpdateUser } from '../api/shop-queries.js';
import { t } from '../text.js';
import { changedUserSchema, readUser, userDifferences, userFormOf, type ChangedUser, type UserForm } from '../user-form.js';
import { RoleFields } from './role-fields.js';

function theirsOf(error: unknown): ChangedUser | null {
  if (!(error instanceof ApiError) || error.code !== 'CHANGED_MEANWHILE') return null;
  const theirs = changedUserSchema.safeParse(error.current);
  return theirs.success ? theirs.data : null;
}

/** Name, roles, and whether the sign-in is open. */
export function EditPerson({ user, onClose }: { readonly user: UserView; readonly onClose: () => void }) {
  const update = useUpdateUser(user.id);
  const tell = useTell();
  const isCustomer = user.customerId !== null;
  const [version, setVersion] = useState(user.version);
  const form = useForm<UserForm>({ defaultValues: userFormOf(user) });
  const { control, setError, reset, getValues } = form;
  const theirs = useMemo(() => theirsOf(update.error), [update.error]);
  const send = (values: UserForm, asOf: number) => {
    const { candidate, problems } = readUser(values, isCustomer, asOf);
    const input = updateUserSchema.safeParse(candidate);
    if (problems.length > 0 || !input.success) return showProblems([...problems, ...(input.success ? [] : problemsOf(input.error))], setError);
    update.mutate(input.data, {
      onSuccess: ({ name }) => {
        tell(t('saved', { name }));
        onClose();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <Dialog isOpen onClose={onClose} title={t('editTitle', { name: user.name })}>
      <form
        noValidate
        onSubmit={(e) => {
          e.preventDefault();
          sendForm(form, (values) => send(values, version));
        }}
      >
        <DialogBody>
          <div className="stack">
            <TextField control={control} name="name" label={t('name')} />
            {!isCustomer && <RoleFields control={control} />}
            <CheckField control={control} name="disabled" label={t('closed')} help={t('closedHelp')} />
            {theirs ? (
              <ConflictNotice
                differences={userDifferences(theirs, getValues(), isCustomer)}
                onTakeTheirs={() => {
                  setVersion(theirs.version);
                  reset(userFormOf(theirs));
                  update.reset();
                }}
                onKeepMine={() => sendForm(form, (values) => send(values, theirs.version))}
              />
            ) : (
              <ErrorNotice error={unsaid(update.error)} />
            )}
          </div>
        </DialogBody>
        <DialogFooter
          actions={
            <>
              <Button text={t('cancel')} onClick={onClose} />
              <Button type="submit" intent="primary" text={t('save')} loading={update.isPending} />
            </>
          }
        />
      </form>
    </Dialog>
  );
}
