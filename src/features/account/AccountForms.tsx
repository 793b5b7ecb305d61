import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { NewPassword, PersonName } from '../../../shared/contracts/account';
import { Button } from '../../components/Button';
import { FormFault } from '../../components/FormFault';
import { PasswordField, TextField } from '../../components/TextField';
import { announce } from '../../lib/announce';
import { showRefusal } from '../../lib/forms';
import { useChangePassword, useRenameMe } from './api';
import { passwordHint } from './NewPasswordForm';

const Name = z.object({ name: PersonName });

export function NameForm({ name }: { name: string }) {
  const form = useForm({ resolver: standardSchemaResolver(Name), defaultValues: { name } });
  const rename = useRenameMe();
  const [fault, setFault] = useState<string | null>(null);
  const submit = form.handleSubmit((values) => {
    setFault(null);
    rename.mutate(values, {
      onSuccess: ({ me }) => {
        form.reset({ name: me.name });
        announce('Saved');
      },
      onError: (error) => setFault(showRefusal(error, ['name'], form.setError)),
    });
  });
  return (
    <form noValidate onSubmit={submit} className="space-y-3">
      <TextField
        label="What people call you"
        autoComplete="name"
        error={form.formState.errors.name?.message}
        {...form.register('name')}
      />
      <FormFault>{fault}</FormFault>
      <div className="flex items-center gap-3">
        <Button type="submit" busy={rename.isPending ? 'Saving' : undefined}>
          Save the name
        </Button>
        {rename.isSuccess && !form.formState.isDirty && <span className="text-sm font-bold text-good">Saved</span>}
      </div>
    </form>
  );
}

const Passwords = z.object({
  current: z.string().min(1, 'Write the password that you have now.'),
  password: NewPassword,
});

export function PasswordForm() {
  const form = useForm({ resolver: standardSchemaResolver(Passwords), defaultValues: { current: '', password: '' } });
  const { errors } = form.formState;
  const change = useChangePassword();
  const [fault, setFault] = useState<string | null>(null);
  const submit = form.handleSubmit((values) => {
    setFault(null);
    change.mutate(values, {
      onSuccess: () => {
        form.reset();
        announce('The password was changed');
      },
      onError: (error) => setFault(showRefusal(error, ['current', 'password'], form.setError)),
    });
  });
  return (
    <form noValidate onSubmit={submit} className="space-y-3">
      <PasswordField
        label="The password that you have now"
        error={errors.current?.message}
        {...form.register('current')}
      />
      <PasswordField
        label="New password"
        hint={passwordHint}
        autoComplete="new-password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <FormFault>{fault}</FormFault>
      <Button type="submit" busy={change.isPending ? 'Changing' : undefined}>
        Change the password
      </Button>
      {change.isSuccess && (
        <p className="text-sm font-bold text-good">
          The password was changed. On every other device you are signed out.
        </p>
      )}
    </form>
  );
}
