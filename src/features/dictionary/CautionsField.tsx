import { useFieldArray, useFormContext } from 'react-hook-form';
import { Button } from '../../components/Button';
import { TextField } from '../../components/TextField';
import { LineTools, TakenOut } from './LineTools';
import type { MovementValues } from './movementValues';
import { useListTools } from './useListTools';

const most = 10;

/** Cautions as members see them: what to do, and a sentence more. */
export function CautionsField() {
  const { control, register, getValues, formState } = useFormContext<MovementValues>();
  const cautions = useFieldArray({ control, name: 'cautions' });
  const tools = useListTools(
    cautions,
    (at) => getValues(`cautions.${at}`),
    ({ say, more }) => say || more,
  );
  const errors = formState.errors.cautions;
  return (
    <fieldset className="min-w-0">
      <legend className="text-base font-extrabold">Cautions</legend>
      <p className="mb-2 text-sm text-ink2">
        Where it can hurt: what to do first, and when to stop. Members see them with every plan that has this movement.
      </p>
      <div ref={tools.box} className="grid gap-2.5">
        {cautions.fields.map((caution, at) => (
          <div
            key={caution.id}
            data-line={at}
            className="caution flex flex-wrap items-start justify-end gap-1 bg-surface py-2 ps-3 pe-3 sm:flex-nowrap sm:pe-1"
          >
            <div className="grid min-w-0 grow basis-full gap-2 sm:basis-0">
              <TextField
                label={`Caution ${at + 1}: what to do`}
                placeholder="Clear the floor before you hop."
                autoComplete="off"
                error={errors?.[at]?.say?.message}
                {...register(`cautions.${at}.say`)}
              />
              <TextField
                label={`Caution ${at + 1}: more`}
                optional
                placeholder="Stop on sharp pain, chest pain or dizziness."
                autoComplete="off"
                error={errors?.[at]?.more?.message}
                {...register(`cautions.${at}.more`)}
              />
            </div>
            <LineTools tools={tools} at={at} what={`caution ${at + 1}`} />
          </div>
        ))}
        <TakenOut taken={tools.taken} />
        {cautions.fields.length < most && (
          <Button
            size="small"
            className="justify-self-start"
            data-does="add"
            onClick={() => cautions.append({ say: '', more: '' })}
          >
            Add a caution
          </Button>
        )}
      </div>
    </fieldset>
  );
}
