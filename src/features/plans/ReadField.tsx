import { clsx } from 'clsx';
import { type ComponentProps, useState } from 'react';
import { Field, type FieldTexts, inputLook } from '../../components/Field';

type Props = Omit<FieldTexts, 'error'> &
  Omit<ComponentProps<'input'>, 'value' | 'onChange'> & {
    value: string;
    onChange: (text: string) => void;
    /** what a text means, written out, or what is wrong with it */
    read: (text: string) => { understood: string } | { fault: string };
    /** whether an empty field is at fault too */
    empty: 'fine' | 'fault';
  };

/**
 * Text with a meaning, such as a dose. While one types, what is understood stands below; on leaving, the field holds it written
 * out, or says what is wrong and keeps what was typed.
 */
export function ReadField({
  value,
  onChange,
  read,
  empty,
  label,
  hint,
  optional,
  labelled,
  className,
  ...input
}: Props) {
  const [focus, setFocus] = useState<'in' | 'out'>('out');
  const isEmpty = value.trim() === '';
  const found = isEmpty && empty === 'fine' ? null : read(value);
  const fault = found && 'fault' in found ? found.fault : null;
  const understood = found && 'understood' in found ? found.understood : null;
  return (
    <Field
      {...{ label, hint, optional, labelled }}
      className={clsx('relative', className)}
      error={focus === 'out' ? fault : undefined}
    >
      {(wiring) => (
        <>
          <input
            autoComplete="off"
            spellCheck={false}
            {...input}
            {...wiring}
            type="text"
            value={value}
            className={inputLook}
            onChange={(event) => onChange(event.target.value)}
            onFocus={() => setFocus('in')}
            onBlur={() => {
              setFocus('out');
              if (understood !== null && understood !== value) onChange(understood);
            }}
          />
          {focus === 'in' && !isEmpty && understood !== value && (
            <div
              aria-hidden="true"
              className="absolute start-0 top-full z-10 w-max max-w-[min(20rem,80vw)] min-w-full rounded border-thin border-edge bg-surface px-3 py-1 text-sm"
            >
              {understood === null ? (
                <span className="text-ink2">not understood yet</span>
              ) : (
                <>
                  read as <b>{understood}</b>
                </>
              )}
            </div>
          )}
        </>
      )}
    </Field>
  );
}
