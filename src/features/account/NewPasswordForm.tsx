import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { NewPassword } from '../../../shared/contracts/account';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { PasswordField } from '../../components/TextField';
import { showRefusal } from '../../lib/forms';
import { useResetPassword } from './api';

const Values = z.object({ password: NewPassword });

export const passwordHint =
  'At least 15 characters. A few words that only you would put together are easy to keep in mind.';

/** With the secret of a mailed link. */
export function NewPasswordForm({ secret, onDone }: { secret: string; onDone: () => void }) {
  const form = useForm({ resolver: standardSchemaResolver(Values), defaultValues: { password: '' } });
  const reset = useResetPassword();
  const [fault, setFault] = useState<string | null>(null);
  const submit = form.handleSubmit(({ password }) => {
    setFault(null);
    reset.mutate(
      { secret, password },
      { onSuccess: onDone, onError: (error) => setFault(showRefusal(error, ['password'], form.setError)) },
    );
  });
  return (
    <form noValidate onSubmit={submit} className="space-y-4">
      <PasswordField
        label="New password"
        hint={passwordHint}
        autoComplete="new-password"
        error={form.formState.errors.password?.message}
        {...form.register('password')}
      />
      <FormFault>{fault}</FormFault>
      <GoButton type="submit" busy={reset.isPending ? 'Saving' : undefined}>
        Set the password
      </GoButton>
    </form>
  );
}
