import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { PasswordField, TextField } from '../../components/TextField';
import { TextLink } from '../../components/TextLink';
import { showRefusal } from '../../lib/forms';
import { useSignIn } from './api';

const Values = z.object({
  email: z.string().trim().min(1, 'Write your e-mail address.'),
  password: z.string().min(1, 'Write your password.'),
});

/** @param onDone where to go once signed in */
export function SignInForm({ onDone }: { onDone: () => void }) {
  const form = useForm({ resolver: standardSchemaResolver(Values), defaultValues: { email: '', password: '' } });
  const { errors } = form.formState;
  const signIn = useSignIn();
  const [fault, setFault] = useState<string | null>(null);
  const submit = form.handleSubmit((values) => {
    setFault(null);
    signIn.mutate(values, {
      onSuccess: onDone,
      onError: (error) => setFault(showRefusal(error, ['email', 'password'], form.setError)),
    });
  });
  return (
    <form noValidate onSubmit={submit} className="space-y-4">
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        inputMode="email"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <PasswordField
        label="Password"
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register('password')}
      />
      <FormFault>{fault}</FormFault>
      <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
        <GoButton type="submit" busy={signIn.isPending ? 'Signing in' : undefined}>
          Sign in
        </GoButton>
        <TextLink to="/forgot-password">Forgot the password?</TextLink>
      </div>
    </form>
  );
}
