import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { NewPassword, PersonName, type readInvitation } from '../../../shared/contracts/account';
import type { Output } from '../../../shared/contracts/endpoint';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { PasswordField, TextField } from '../../components/TextField';
import { showRefusal } from '../../lib/forms';
import { useAcceptInvitation } from './api';
import { passwordHint } from './NewPasswordForm';

const NewPerson = z.object({ name: PersonName, password: NewPassword });
const KnownPerson = z.object({ name: z.string(), password: z.string().min(1, 'Write your password.') });

type Props = { secret: string; invitation: Output<typeof readInvitation>; onDone: (teamSlug: string) => void };

/** A new person says their name and chooses a password; one with an account gives theirs. */
export function JoinForm({ secret, invitation, onDone }: Props) {
  const { hasAccount } = invitation;
  const form = useForm({
    resolver: standardSchemaResolver(hasAccount ? KnownPerson : NewPerson),
    defaultValues: { name: invitation.name ?? '', password: '' },
  });
  const { errors } = form.formState;
  const join = useAcceptInvitation();
  const [fault, setFault] = useState<string | null>(null);
  const submit = form.handleSubmit(({ name, password }) => {
    setFault(null);
    join.mutate(
      { secret, password, ...(hasAccount ? {} : { name }) },
      {
        onSuccess: ({ teamSlug }) => onDone(teamSlug),
        onError: (error) => setFault(showRefusal(error, ['name', 'password'], form.setError)),
      },
    );
  });
  return (
    <form noValidate onSubmit={submit} className="space-y-4">
      <TextField label="E-mail" type="email" value={invitation.email} readOnly autoComplete="username" />
      {!hasAccount && (
        <TextField
          label="What people call you"
          autoComplete="name"
          error={errors.name?.message}
          {...form.register('name')}
        />
      )}
      <PasswordField
        label={hasAccount ? 'Your password' : 'Choose a password'}
        hint={hasAccount ? 'You have an account already; it gets this team too.' : passwordHint}
        autoComplete={hasAccount ? 'current-password' : 'new-password'}
        error={errors.password?.message}
        {...form.register('password')}
      />
      <FormFault>{fault}</FormFault>
      <GoButton type="submit" busy={join.isPending ? 'Joining' : undefined}>
        Join {invitation.team}
      </GoButton>
    </form>
  );
}
