import { type ComponentProps, type ReactNode, useId } from 'react';

type CheckProps = Omit<ComponentProps<'input'>, 'type'> & {
  label: ReactNode;
  hint?: ReactNode;
  /** `one` of several that share a `name`, or any number of them */
  choose?: 'any' | 'one';
};

/** A box to tick, its words to the right and part of the target. */
export function CheckField({ label, hint, choose = 'any', className, ...input }: CheckProps) {
  const hintId = useId();
  return (
    <label className="flex min-h-target items-center gap-3 py-1">
      <input
        {...input}
        type={choose === 'one' ? 'radio' : 'checkbox'}
        aria-describedby={hint ? hintId : undefined}
        className="size-5.5 flex-none accent-ink"
      />
      <span className="min-w-0">
        <span className="font-bold">{label}</span>
        {hint && (
          <span id={hintId} className="block text-sm text-ink2">
            {hint}
          </span>
        )}
      </span>
    </label>
  );
}

/** Boxes that belong together under one question. */
export function CheckGroup({
  legend,
  hint,
  error,
  children,
}: {
  legend: ReactNode;
  hint?: ReactNode;
  error?: ReactNode;
  children: ReactNode;
}) {
  const id = useId();
  const described = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return (
    <fieldset aria-describedby={described || undefined}>
      <legend className="text-sm font-bold">{legend}</legend>
      {hint && (
        <div id={`${id}-hint`} className="text-sm text-ink2">
          {hint}
        </div>
      )}
      <div className="mt-1">{children}</div>
      {error && (
        <div id={`${id}-error`} className="mt-1 text-sm font-bold text-danger">
          {error}
        </div>
      )}
    </fieldset>
  );
}
