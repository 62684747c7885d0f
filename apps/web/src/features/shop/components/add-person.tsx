import { createUserSchema } from '@shared/session';
import { useForm, useWatch } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { ChoiceField, TextField } from '../../../components/fields.js';
import { useTell } from '../../../components/toaster.js';
import { problemsOf, showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useCreateUser } from '../api/shop-queries.js';
import { t } from '../text.js';
import { emptyUser, readNewUser, type NewUserForm } from '../user-form.js';
import { CustomerChoice } from './customer-choice.js';
import { RoleFields } from './role-fields.js';

const SIDES = (['shop', 'customer'] as const).map((value) => ({ value, label: t(`side-${value}`) }));

/** Somebody new who may sign in: of the shop, or of a customer. */
export function AddPerson({ onClose }: { readonly onClose: () => void }) {
  const create = useCreateUser();
  const tell = useTell();
  const form = useForm<NewUserForm>({ defaultValues: emptyUser });
  const { control, setError } = form;
  const side = useWatch({ control, name: 'side' });
  const send = (values: NewUserForm) => {
    const { candidate, problems } = readNewUser(values);
    const input = createUserSchema.safeParse(candidate);
    if (problems.length > 0 || !input.success) return showProblems([...problems, ...(input.success ? [] : problemsOf(input.error))], setError);
    create.mutate(input.data, {
      onSuccess: ({ name }) => {
        tell(t('added', { name }));
        onClose();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <ConfirmDialog open title={t('addTitle')} confirm={t('addConfirm')} pending={create.isPending} error={unsaid(create.error)} onConfirm={() => sendForm(form, send)} onClose={onClose}>
      <ChoiceField control={control} name="side" label={t('side')} options={SIDES} />
      <TextField control={control} name="name" label={t('name')} />
      <TextField control={control} name="email" type="email" label={t('email')} help={t('emailHelp')} />
      {side === 'shop' ? <RoleFields control={control} /> : <CustomerChoice control={control} />}
      <TextField control={control} name="password" type="password" label={t('password')} help={t('passwordHelp')} autoComplete="new-password" />
    </ConfirmDialog>
  );
}
