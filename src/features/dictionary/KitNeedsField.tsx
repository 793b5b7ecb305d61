import { useFieldArray, useFormContext } from 'react-hook-form';
import { Button } from '../../components/Button';
import { IconButton } from '../../components/IconButton';
import { SelectField, TextField } from '../../components/TextField';
import type { KitById } from './kitWords';
import { type MovementValues, newOption } from './movementValues';

const most = 10;

/** What a movement needs: every need at once, each met by any one of its items. */
export function KitNeedsField({ kit }: { kit: KitById }) {
  const { control } = useFormContext<MovementValues>();
  const needs = useFieldArray({ control, name: 'kitNeeded' });
  return (
    <fieldset className="min-w-0">
      <legend className="text-base font-extrabold">Kit needed</legend>
      <p className="mb-2 text-sm text-ink2">
        {kit.size === 0
          ? 'The team has named no kit yet. Add items on the page Kit, then say here what this movement needs.'
          : 'Members who lack it are shown what to do instead. Without an entry it needs nothing.'}
      </p>
      <div className="grid gap-2">
        {needs.fields.map((need, at) => (
          <Need key={need.id} at={at} kit={kit} onRemove={() => needs.remove(at)} />
        ))}
        {needs.fields.length < most && kit.size > 0 && (
          <Button
            size="small"
            className="justify-self-start"
            onClick={() =>
              needs.append(
                { options: [newOption()] },
                { focusName: `kitNeeded.${needs.fields.length}.options.0.kitItemId` },
              )
            }
          >
            {needs.fields.length === 0 ? 'Add what it needs' : 'And something else too'}
          </Button>
        )}
      </div>
    </fieldset>
  );
}

function Need({ at, kit, onRemove }: { at: number; kit: KitById; onRemove: () => void }) {
  const { control, register, watch, formState } = useFormContext<MovementValues>();
  const options = useFieldArray({ control, name: `kitNeeded.${at}.options` });
  const errors = formState.errors.kitNeeded?.[at]?.options;
  const items = [...kit.values()];
  return (
    <fieldset aria-label={`Need ${at + 1}`} className="grid min-w-0 gap-2 border-s-4 border-line ps-3">
      {options.fields.map((option, place) => {
        const base = `kitNeeded.${at}.options.${place}` as const;
        const chosen = watch(`${base}.kitItemId`);
        const loadCounts = (kit.get(chosen)?.loadMatters ?? false) || watch(`${base}.minLoadKg`) !== '';
        const error = errors?.[place];
        const what = `Need ${at + 1}, ${place === 0 ? 'item' : `or item ${place + 1}`}`;
        return (
          <div key={option.id} className="flex flex-wrap items-start gap-2">
            {place > 0 && <span className="w-full text-sm font-bold text-ink2">or</span>}
            <TextField
              label={`${what}: how many`}
              labelled="hidden"
              className="w-16"
              inputMode="numeric"
              error={error?.count?.message}
              {...register(`${base}.count`)}
            />
            <SelectField
              label={what}
              labelled="hidden"
              className="min-w-0 grow basis-28 sm:max-w-72"
              error={error?.kitItemId?.message}
              {...register(`${base}.kitItemId`)}
            >
              <option value="" disabled>
                Choose an item
              </option>
              {chosen !== '' && !kit.has(chosen) && <option value={chosen}>an item that is gone</option>}
              {items.map((item) => (
                <option key={item.id} value={item.id}>
                  {item.name}
                </option>
              ))}
            </SelectField>
            {loadCounts && (
              <span className="flex items-start gap-2">
                <span aria-hidden="true" className="flex min-h-target items-center text-sm">
                  from
                </span>
                <TextField
                  label={`${what}: least load of each in kg`}
                  labelled="hidden"
                  className="w-20"
                  inputMode="decimal"
                  placeholder="any"
                  error={error?.minLoadKg?.message}
                  {...register(`${base}.minLoadKg`)}
                />
                <span aria-hidden="true" className="flex min-h-target items-center text-sm">
                  kg
                </span>
              </span>
            )}
            <IconButton
              icon="close"
              label={`Take ${what.toLowerCase()} out`}
              look="quiet"
              onClick={() => (options.fields.length === 1 ? onRemove() : options.remove(place))}
            />
          </div>
        );
      })}
      {options.fields.length < most && (
        <Button
          size="small"
          look="quiet"
          className="justify-self-start"
          onClick={() =>
            options.append(newOption(), { focusName: `kitNeeded.${at}.options.${options.fields.length}.kitItemId` })
          }
        >
          Or something else
        </Button>
      )}
    </fieldset>
  );
}
