import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { Email } from '../../../shared/contracts/account';
import { roles } from '../../../shared/domain/words';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { SelectField, TextField } from '../../components/TextField';
import { announce } from '../../lib/announce';
import { showRefusal } from '../../lib/forms';
import { useInvite } from './api';
import { roleOptions, roleWords } from './roleWords';

const Values = z.object({
  email: Email,
  name: z.string().trim().max(80, 'At most 80 characters.'),
  role: z.enum(roles),
});

/** Sends a single-use link by mail. */
export function InviteForm({ team }: { team: string }) {
  const form = useForm({
    resolver: standardSchemaResolver(Values),
    defaultValues: { email: '', name: '', role: 'member' as const },
  });
  const { errors } = form.formState;
  const invite = useInvite(team);
  const [fault, setFault] = useState<string | null>(null);
  const role = form.watch('role');
  const submit = form.handleSubmit(({ email, name, role: chosen }) => {
    setFault(null);
    invite.mutate(
      { email, role: chosen, ...(name ? { name } : {}) },
      {
        onSuccess: () => {
          form.reset({ email: '', name: '', role: chosen as 'member' });
          announce(`Invitation sent to ${email}`);
        },
        onError: (error) => setFault(showRefusal(error, ['email', 'name', 'role'], form.setError)),
      },
    );
  });
  return (
    <form noValidate onSubmit={submit} className="max-w-3xl space-y-3">
      <div className="grid gap-3 sm:grid-cols-3">
        <TextField
          label="E-mail"
          type="email"
          inputMode="email"
          autoComplete="off"
          error={errors.email?.message}
          {...form.register('email')}
        />
        <TextField label="Name" optional autoComplete="off" error={errors.name?.message} {...form.register('name')} />
        <SelectField label="Role" options={roleOptions} error={errors.role?.message} {...form.register('role')} />
      </div>
      <p className="text-sm text-ink2">
        {roleWords[role].name}: {roleWords[role].does}.
      </p>
      <FormFault>{fault}</FormFault>
      <div className="flex flex-wrap items-center gap-4">
        <GoButton type="submit" busy={invite.isPending ? 'Sending' : undefined}>
          Send the invitation
        </GoButton>
        {invite.isSuccess && <p className="text-sm font-bold text-good">Sent to {invite.data.email}.</p>}
      </div>
    </form>
  );
}
