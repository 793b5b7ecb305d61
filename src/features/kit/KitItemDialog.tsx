import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import type { KitItem } from '../../../shared/contracts/kit';
import { shortText } from '../../../shared/domain/values';
import { Button } from '../../components/Button';
import { CheckField } from '../../components/CheckField';
import { Dialog } from '../../components/Dialog';
import { FormFault } from '../../components/FormFault';
import { TextField } from '../../components/TextField';
import { showRefusal } from '../../lib/forms';
import { useAddKitItem, useUpdateKitItem } from './api';

const Values = z.object({
  name: shortText(60),
  otherNames: z.string(),
  withoutText: shortText(80),
  loadMatters: z.boolean(),
});
const fields = ['name', 'otherNames', 'withoutText', 'loadMatters'] as const;

/** @param item the one to change; null adds one */
export function KitItemDialog({ team, item, onClose }: { team: string; item: KitItem | null; onClose: () => void }) {
  const form = useForm({
    resolver: standardSchemaResolver(Values),
    defaultValues: {
      name: item?.name ?? '',
      otherNames: item?.otherNames.join(', ') ?? '',
      withoutText: item?.withoutText ?? '',
      loadMatters: item?.loadMatters ?? false,
    },
  });
  const { errors } = form.formState;
  const add = useAddKitItem(team);
  const update = useUpdateKitItem(team);
  const [fault, setFault] = useState<string | null>(null);
  const submit = form.handleSubmit((values) => {
    setFault(null);
    const otherNames = values.otherNames
      .split(/[,;\n]/)
      .map((name) => name.trim())
      .filter(Boolean);
    const after = {
      onSuccess: onClose,
      onError: (error: Error) => setFault(showRefusal(error, fields, form.setError)),
    };
    if (item) update.mutate({ ...values, otherNames, kitItemId: item.id, version: item.version }, after);
    else add.mutate({ ...values, otherNames }, after);
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title={item ? `Change ${item.name}` : 'Add a kit item'}
      actions={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button
            look="plain"
            className="border-ink"
            busy={add.isPending || update.isPending ? 'Saving' : undefined}
            onClick={submit}
          >
            Save
          </Button>
        </>
      }
    >
      <form noValidate onSubmit={submit} className="space-y-3">
        <TextField label="Name" placeholder="dumbbell" error={errors.name?.message} {...form.register('name')} />
        <TextField
          label="Other names"
          optional
          hint="With commas between: hand weight, DB"
          error={errors.otherNames?.message}
          {...form.register('otherNames')}
        />
        <TextField
          label="How its absence is said"
          placeholder="no dumbbell"
          error={errors.withoutText?.message}
          {...form.register('withoutText')}
        />
        <CheckField
          label="The load matters"
          hint="Members then say how heavy theirs are."
          {...form.register('loadMatters')}
        />
        <FormFault>{fault}</FormFault>
        {/* lets Enter in a field save */}
        <button type="submit" hidden />
      </form>
    </Dialog>
  );
}
