import { Button } from '@blueprintjs/core';
import { zodResolver } from '@hookform/resolvers/zod';
import { signInSchema, type Me } from '@shared/session';
import { useForm } from 'react-hook-form';
import { TextField } from '../../components/fields.js';
import { ErrorNotice } from '../../components/notices.js';
import { useSignIn } from '../../lib/me.js';
import { t } from './text.js';

export function SignInForm({ onDone, email = '' }: { readonly onDone: (me: Me) => void; readonly email?: string }) {
  const signIn = useSignIn();
  const { control, handleSubmit } = useForm({ resolver: zodResolver(signInSchema), defaultValues: { email, password: '' } });
  return (
    <form className="stack" noValidate onSubmit={handleSubmit((values) => signIn.mutate(values, { onSuccess: onDone }))}>
      <TextField control={control} name="email" type="email" label={t('email')} autoComplete="username" autoFocus={email === ''} />
      <TextField control={control} name="password" type="password" label={t('password')} autoComplete="current-password" autoFocus={email !== ''} />
      {signIn.error && <ErrorNotice error={signIn.error} />}
      <Button type="submit" intent="primary" text={t('signIn')} loading={signIn.isPending} fill />
    </form>
  );
}
