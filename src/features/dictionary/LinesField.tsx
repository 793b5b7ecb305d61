import { useFieldArray, useFormContext } from 'react-hook-form';
import { Button } from '../../components/Button';
import { TextField } from '../../components/TextField';
import { LineTools, TakenOut } from './LineTools';
import type { MovementValues } from './movementValues';
import { useListTools } from './useListTools';

type Props = {
  name: 'points' | 'faults';
  legend: string;
  hint: string;
  /** “point” */
  one: string;
  placeholder: string;
};

const most = 20;

/** Short lines of text, in order. */
export function LinesField({ name, legend, hint, one, placeholder }: Props) {
  const { control, register, getValues, formState } = useFormContext<MovementValues>();
  const lines = useFieldArray({ control, name });
  const tools = useListTools(
    lines,
    (at) => getValues(`${name}.${at}`),
    ({ text }) => text,
  );
  return (
    <fieldset className="min-w-0">
      <legend className="text-base font-extrabold">{legend}</legend>
      <p className="mb-2 text-sm text-ink2">{hint}</p>
      <div ref={tools.box} className="grid gap-1.5">
        {lines.fields.map((line, at) => (
          <div key={line.id} data-line={at} className="flex flex-wrap items-start justify-end gap-1 sm:flex-nowrap">
            <TextField
              label={`${legend}, ${one} ${at + 1}`}
              labelled="hidden"
              className="min-w-0 grow basis-full sm:basis-0"
              placeholder={placeholder}
              autoComplete="off"
              error={formState.errors[name]?.[at]?.text?.message}
              onKeyDown={(event) => {
                // Enter goes on to the next line, as on paper
                if (event.key !== 'Enter' || event.nativeEvent.isComposing || event.ctrlKey || event.metaKey) return;
                event.preventDefault();
                if (lines.fields.length < most) lines.insert(at + 1, { text: '' });
              }}
              {...register(`${name}.${at}.text`)}
            />
            <LineTools tools={tools} at={at} what={`${one} ${at + 1}`} />
          </div>
        ))}
        <TakenOut taken={tools.taken} />
        {lines.fields.length < most && (
          <Button
            size="small"
            className="justify-self-start"
            data-does="add"
            onClick={() => lines.append({ text: '' })}
          >
            Add a {one}
          </Button>
        )}
      </div>
    </fieldset>
  );
}
