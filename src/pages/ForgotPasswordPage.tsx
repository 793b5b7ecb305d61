import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Email } from '../../shared/contracts/account';
import { FormFault } from '../components/FormFault';
import { GoButton } from '../components/GoButton';
import { PageTitle } from '../components/PageTitle';
import { TextField } from '../components/TextField';
import { TextLink } from '../components/TextLink';
import { useForgotPassword } from '../features/account/api';
import { showRefusal } from '../lib/forms';

const Values = z.object({ email: Email });

export function ForgotPasswordPage() {
  const form = useForm({ resolver: standardSchemaResolver(Values), defaultValues: { email: '' } });
  const send = useForgotPassword();
  const [fault, setFault] = useState<string | null>(null);
  const submit = form.handleSubmit((values) => {
    setFault(null);
    send.mutate(values, { onError: (error) => setFault(showRefusal(error, ['email'], form.setError)) });
  });
  if (send.isSuccess)
    return (
      <div className="space-y-4">
        <PageTitle title="Look into your mail" />
        <p>
          If the address belongs to an account, a link for a new password is on its way. It works once, for an hour.
        </p>
        <TextLink to="/sign-in">Back to sign-in</TextLink>
      </div>
    );
  return (
    <div className="space-y-5">
      <PageTitle title="Forgot the password" />
      <p>Write the address that you sign in with. We send a link to choose a new one.</p>
      <form noValidate onSubmit={submit} className="space-y-4">
        <TextField
          label="E-mail"
          type="email"
          autoComplete="username"
          inputMode="email"
          error={form.formState.errors.email?.message}
          {...form.register('email')}
        />
        <FormFault>{fault}</FormFault>
        <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
          <GoButton type="submit" busy={send.isPending ? 'Sending' : undefined}>
            Send the link
          </GoButton>
          <TextLink to="/sign-in">Back to sign-in</TextLink>
        </div>
      </form>
    </div>
  );
}
