import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { shortText } from '../../../shared/domain/values';
import { Button } from '../../components/Button';
import { FormFault } from '../../components/FormFault';
import { SelectField, TextField } from '../../components/TextField';
import { showRefusal } from '../../lib/forms';
import { useUpdateTeam } from './api';

const Values = z.object({ name: shortText(80), timeZone: z.string() });

/** The team's name, and the time zone that says which day is today. */
export function TeamForm({ team, name, timeZone }: { team: string; name: string; timeZone: string }) {
  const form = useForm({ resolver: standardSchemaResolver(Values), defaultValues: { name, timeZone } });
  const { errors, isDirty } = form.formState;
  const update = useUpdateTeam(team);
  const [fault, setFault] = useState<string | null>(null);
  const zones = [...new Set([timeZone, ...Intl.supportedValuesOf('timeZone')])].map((zone) => ({
    value: zone,
    label: zone.replaceAll('_', ' '),
  }));
  const submit = form.handleSubmit((values) => {
    setFault(null);
    update.mutate(values, {
      onSuccess: (changed) => form.reset({ name: changed.name, timeZone: changed.timeZone }),
      onError: (error) => setFault(showRefusal(error, ['name', 'timeZone'], form.setError)),
    });
  });
  return (
    <form noValidate onSubmit={submit} className="max-w-3xl space-y-3">
      <div className="grid gap-3 sm:grid-cols-2">
        <TextField label="Name of the team" error={errors.name?.message} {...form.register('name')} />
        <SelectField
          label="Time zone"
          options={zones}
          error={errors.timeZone?.message}
          {...form.register('timeZone')}
        />
      </div>
      <FormFault>{fault}</FormFault>
      <div className="flex items-center gap-3">
        <Button type="submit" busy={update.isPending ? 'Saving' : undefined}>
          Save the team
        </Button>
        {update.isSuccess && !isDirty && <span className="text-sm font-bold text-good">Saved</span>}
      </div>
    </form>
  );
}
