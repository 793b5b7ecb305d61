import { clsx } from 'clsx';
import { type ComponentProps, useState } from 'react';
import { Button } from './Button';
import { Field, type FieldTexts, inputLook } from './Field';

/** `className` is the field's, so that it can be given a width; everything else goes to the control, `ref` included. */
export function TextField({
  label,
  hint,
  error,
  optional,
  labelled,
  id,
  className,
  ...input
}: FieldTexts & ComponentProps<'input'>) {
  return (
    <Field {...{ label, hint, error, optional, labelled, id, className }}>
      {(wiring) => <input type="text" {...input} {...wiring} className={inputLook} />}
    </Field>
  );
}

export function TextAreaField({
  label,
  hint,
  error,
  optional,
  labelled,
  id,
  className,
  ...area
}: FieldTexts & ComponentProps<'textarea'>) {
  return (
    <Field {...{ label, hint, error, optional, labelled, id, className }}>
      {(wiring) => (
        <textarea
          rows={3}
          {...area}
          {...wiring}
          className={clsx(inputLook, 'field-sizing-content block min-h-22! leading-normal')}
        />
      )}
    </Field>
  );
}

/** Few choices that everybody knows; `options` in order, or `option` elements as children. */
export function SelectField({
  label,
  hint,
  error,
  optional,
  labelled,
  id,
  className,
  options = [],
  children,
  ...select
}: FieldTexts & ComponentProps<'select'> & { options?: readonly { value: string; label: string }[] }) {
  return (
    <Field {...{ label, hint, error, optional, labelled, id, className }}>
      {(wiring) => (
        <select {...select} {...wiring} className={inputLook}>
          {children}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}

/** A password that can be shown while it is typed, and pasted. */
export function PasswordField({
  label,
  hint,
  error,
  optional,
  labelled,
  id,
  className,
  ...input
}: FieldTexts & Omit<ComponentProps<'input'>, 'type'>) {
  const [shown, setShown] = useState(false);
  return (
    <Field {...{ label, hint, error, optional, labelled, id, className }}>
      {(wiring) => (
        <div className="flex gap-2">
          <input
            autoComplete="current-password"
            autoCapitalize="none"
            spellCheck={false}
            {...input}
            {...wiring}
            type={shown ? 'text' : 'password'}
            className={inputLook}
          />
          <Button className="flex-none" aria-pressed={shown} aria-controls={wiring.id} onClick={() => setShown(!shown)}>
            {shown ? 'Hide' : 'Show'}
          </Button>
        </div>
      )}
    </Field>
  );
}
