import { useFormContext } from 'react-hook-form';
import { SelectField, TextAreaField, TextField } from '../../components/TextField';
import { CautionsField } from './CautionsField';
import { KitNeedsField } from './KitNeedsField';
import type { KitById } from './kitWords';
import { LinesField } from './LinesField';
import type { MovementValues } from './movementValues';
import { patternOptions } from './patternName';

/** All that is written of a movement. @param formerName what it is called as saved; empty for a new one */
export function MovementFieldset({ kit, formerName }: { kit: KitById; formerName: string }) {
  const { register, watch, formState } = useFormContext<MovementValues>();
  const { errors } = formState;
  const name = watch('name').trim();
  const isRenamed = formerName !== '' && name !== '' && name !== formerName;
  return (
    <div className="grid gap-6">
      <div className="grid gap-3 sm:grid-cols-[minmax(0,1fr)_12rem]">
        <TextField
          label="Name"
          autoComplete="off"
          hint={
            isRenamed ? `“${formerName}” stays as another name, so that searches and plans still find it.` : undefined
          }
          error={errors.name?.message}
          {...register('name')}
        />
        <SelectField label="Pattern" className="self-end" error={errors.pattern?.message} {...register('pattern')}>
          <option value="" disabled>
            Choose one
          </option>
          {patternOptions.map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </SelectField>
        <TextAreaField
          label="Other names"
          optional
          rows={2}
          hint="With commas between: what people say, what is misheard, former names."
          className="sm:col-span-2"
          error={errors.otherNames?.message}
          {...register('otherNames')}
        />
      </div>
      <KitNeedsField kit={kit} />
      <div className="grid items-start gap-6 2xl:grid-cols-2">
        <LinesField
          name="points"
          legend="Points of performance"
          hint="What makes it right, the most telling first."
          one="point"
          placeholder="Ribs down before you press"
        />
        <LinesField
          name="faults"
          legend="Common faults"
          hint="What goes wrong, as one sees it."
          one="fault"
          placeholder="Heels lift"
        />
      </div>
      <CautionsField />
    </div>
  );
}
