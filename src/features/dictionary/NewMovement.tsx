import { FormProvider } from 'react-hook-form';
import { useNavigate } from 'react-router-dom';
import { PageTitle } from '../../components/PageTitle';
import { teamPath } from '../../lib/session';
import { useCreateMovement } from './api';
import type { KitById } from './kitWords';
import { MovementFieldset } from './MovementFieldset';
import { emptyValues } from './movementValues';
import { SaveBar } from './SaveBar';
import { UnsavedGuard } from './UnsavedGuard';
import { useMovementForm } from './useMovementForm';

/** @param name what was looked for and not found */
export function NewMovement({ team, kit, name }: { team: string; kit: KitById; name: string }) {
  const navigate = useNavigate();
  const create = useCreateMovement(team);
  const { form, element, fault, isDirty, unsaved, refuse, send } = useMovementForm(emptyValues(name), (fields) =>
    create.mutate(fields, {
      onSuccess: ({ id }) => {
        unsaved.current = false;
        navigate(teamPath(team, 'movements', id), { replace: true, state: { added: true } });
      },
      onError: refuse,
    }),
  );
  return (
    <div className="max-w-5xl">
      <PageTitle title="Add a movement" meta="picture and substitutions come next" />
      <FormProvider {...form}>
        <form ref={element} noValidate className="mt-4" onSubmit={send}>
          <MovementFieldset kit={kit} formerName="" />
          <SaveBar
            state={create.isPending ? 'saving' : isDirty || name !== '' ? 'changed' : 'unchanged'}
            fault={fault}
            save="Add it"
            saving="Adding"
          />
        </form>
      </FormProvider>
      <UnsavedGuard unsaved={unsaved} />
    </div>
  );
}
