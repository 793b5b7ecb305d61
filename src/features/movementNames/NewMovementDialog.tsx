import { standardSchemaResolver } from '@hookform/resolvers/standard-schema';
import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { MovementName } from '../../../shared/contracts/movements';
import { Id } from '../../../shared/domain/values';
import { patterns } from '../../../shared/domain/words';
import { Button } from '../../components/Button';
import { CheckField, CheckGroup } from '../../components/CheckField';
import { Dialog } from '../../components/Dialog';
import { GoButton } from '../../components/GoButton';
import { SelectField, TextField } from '../../components/TextField';
import { ApiError } from '../../lib/api';
import { kitQuery } from '../../lib/libraryQueries';
import { useCreateMovement } from './api';

const NewMovement = z.object({
  name: MovementName,
  pattern: z.enum(patterns, 'Choose the pattern that fits best.'),
  kit: z.array(Id).max(10, 'At most 10 pieces of kit.'),
});

type Props = {
  team: string;
  name: string;
  onMade: (movement: { id: string; name: string }) => void;
  onClose: () => void;
};

/** A movement for the dictionary, made on the spot: only what finding and substituting need. */
export function NewMovementDialog({ team, name, onMade, onClose }: Props) {
  const create = useCreateMovement(team);
  const { data: kit = [] } = useQuery(kitQuery(team));
  const form = useForm({ resolver: standardSchemaResolver(NewMovement), defaultValues: { name, kit: [] } });
  const { errors } = form.formState;
  const send = form.handleSubmit(async (fields) => {
    try {
      const made = await create.mutateAsync({
        team,
        name: fields.name,
        pattern: fields.pattern,
        kitNeeded: fields.kit.map((kitItemId) => ({ anyOf: [{ kitItemId }] })),
      });
      onMade({ id: made.id, name: made.name });
    } catch (refused) {
      if (!(refused instanceof ApiError)) throw refused;
      form.setError('name', { message: refused.fields.name ?? refused.message });
    }
  });
  return (
    <Dialog
      open
      onClose={onClose}
      title="Add a movement to the dictionary"
      actions={
        <>
          <Button onClick={onClose}>Leave it</Button>
          <GoButton busy={create.isPending ? 'Adding' : undefined} onClick={() => void send()}>
            Add it
          </GoButton>
        </>
      }
    >
      <form
        noValidate
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          void send();
        }}
      >
        <TextField label="Name" maxLength={80} error={errors.name?.message} {...form.register('name')} />
        <SelectField
          label="Pattern"
          error={errors.pattern?.message}
          data-first-focus
          defaultValue=""
          {...form.register('pattern')}
        >
          <option value="" disabled>
            Choose one
          </option>
          {patterns.map((pattern) => (
            <option key={pattern} value={pattern}>
              {pattern}
            </option>
          ))}
        </SelectField>
        <CheckGroup
          legend="Kit needed"
          hint="None ticked means that nothing is needed. Counts, loads and alternatives are added in the dictionary."
          error={errors.kit?.message}
        >
          <div className="grid grid-cols-[repeat(auto-fill,minmax(10rem,1fr))] gap-x-4">
            {kit.map((item) => (
              <CheckField key={item.id} label={item.name} value={item.id} {...form.register('kit')} />
            ))}
          </div>
        </CheckGroup>
        <button type="submit" hidden />
      </form>
    </Dialog>
  );
}
