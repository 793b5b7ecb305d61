import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Controller, FormProvider, useForm } from 'react-hook-form';
import { type Movement, Substitution } from '../../../shared/contracts/movements';
import { Button } from '../../components/Button';
import { Dialog } from '../../components/Dialog';
import { FormFault } from '../../components/FormFault';
import { MovementField } from '../../components/MovementField';
import { TextField } from '../../components/TextField';
import { ApiError } from '../../lib/api';
import { showRefusal } from '../../lib/forms';
import { movementNamesQuery } from '../../lib/libraryQueries';
import { useAddSubstitution, useUpdateSubstitution } from './api';
import { DoseRuleFields } from './DoseRuleFields';
import type { KitById } from './kitWords';
import { LackField } from './LackField';
import { SubstitutionWords } from './SubstitutionWords';
import {
  emptySubstitution,
  SubstitutionValues,
  substitutionFieldsOf,
  substitutionValuesOf,
} from './substitutionValues';

type Props = {
  team: string;
  movement: Movement;
  kit: KitById;
  /** the one to change; null adds one */
  substitution: Substitution | null;
  onClose: () => void;
};

const fields = ['toMovementId', 'lack', 'reason'] as const;

/** What to do instead of a movement, for whom, and how much of it. */
export function SubstitutionDialog({ team, movement, kit, substitution, onClose }: Props) {
  const { data: movements = [] } = useQuery(movementNamesQuery(team));
  const add = useAddSubstitution(team, movement.id);
  const update = useUpdateSubstitution(team, movement.id);
  const [fault, setFault] = useState<string | null>(null);
  const [theirs, setTheirs] = useState<Substitution | null>(null);
  const form = useForm({
    resolver: standardSchemaResolver(SubstitutionValues),
    defaultValues: substitution
      ? substitutionValuesOf(substitution)
      : emptySubstitution(movement.kitNeeded[0]?.anyOf[0]?.kitItemId ?? ''),
  });
  const { errors } = form.formState;

  const refuse = (error: Error) => {
    const current = error instanceof ApiError && error.code === 'stale' ? Substitution.safeParse(error.current) : null;
    if (current?.success) return setTheirs(current.data);
    if (error instanceof ApiError && error.fields.missingKitItemId)
      return form.setError('lack', { message: error.fields.missingKitItemId }, { shouldFocus: true });
    setFault(showRefusal(error, fields, form.setError));
  };
  const send = (version: number | undefined) =>
    form.handleSubmit((values) => {
      setFault(null);
      setTheirs(null);
      const after = { onSuccess: onClose, onError: refuse };
      const sent = substitutionFieldsOf(values);
      if (substitution && version !== undefined)
        update.mutate({ ...sent, substitutionId: substitution.id, version }, after);
      else add.mutate(sent, after);
    });
  const [version, setVersion] = useState(substitution?.version);
  const submit = send(version);

  return (
    <Dialog
      open
      onClose={onClose}
      title={`Instead of ${movement.name}`}
      actions={
        theirs ? (
          <>
            <Button
              onClick={() => {
                form.reset(substitutionValuesOf(theirs));
                setVersion(theirs.version);
                setTheirs(null);
              }}
            >
              Take theirs
            </Button>
            <Button
              onClick={() => {
                setVersion(theirs.version);
                void send(theirs.version)();
              }}
            >
              Keep mine
            </Button>
          </>
        ) : (
          <>
            <Button onClick={onClose}>Cancel</Button>
            <Button
              className="border-ink"
              busy={add.isPending || update.isPending ? 'Saving' : undefined}
              onClick={submit}
            >
              {substitution ? 'Save' : 'Add it'}
            </Button>
          </>
        )
      }
    >
      <FormProvider {...form}>
        <form noValidate onSubmit={submit} className="grid gap-3">
          <Controller
            control={form.control}
            name="toMovementId"
            render={({ field }) => (
              <MovementField
                label="Do instead"
                movements={movements.filter(({ id }) => id !== movement.id)}
                value={field.value}
                placeholder="Type a name"
                error={errors.toMovementId?.message}
                onChange={(chosen) => field.onChange(chosen?.id ?? null)}
              />
            )}
          />
          <LackField
            label="When missing"
            kit={kit}
            needs={movement.kitNeeded}
            error={errors.lack?.message}
            {...form.register('lack')}
          />
          <DoseRuleFields />
          <TextField
            label="Reason"
            hint="Why this one: what it keeps, or how it is easier."
            placeholder="keeps the pull"
            autoComplete="off"
            maxLength={200}
            error={errors.reason?.message}
            {...form.register('reason')}
          />
          <FormFault>{fault}</FormFault>
          {theirs && (
            <div role="alert" className="border-l-4 border-danger bg-ground px-3 py-2 text-sm">
              <p className="font-extrabold">Somebody changed it meanwhile. Theirs reads:</p>
              <SubstitutionWords substitution={theirs} movement={theirs.to} kit={kit} />
              <p className="mt-1">Yours stands above. Which one shall it be?</p>
            </div>
          )}
          <button type="submit" hidden />
        </form>
      </FormProvider>
    </Dialog>
  );
}
