import { type ReactNode, useId } from 'react';

export type FieldTexts = {
  label: ReactNode;
  /** what helps to fill it in, always shown */
  hint?: ReactNode;
  /** what is wrong, in a sentence that says what to do */
  error?: ReactNode;
  /** says “optional” beside the label; fields are needed unless they say so */
  optional?: boolean;
  /** `hidden` keeps the label for screen readers where a heading or a column says it */
  labelled?: 'shown' | 'hidden';
};

export type Wiring = {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
};

type Props = FieldTexts & {
  id?: string;
  className?: string;
  /** the control, given the id and the texts that belong to it */
  children: (wiring: Wiring) => ReactNode;
};

/** A control with its label above, its hint, and its error below. */
export function Field({ label, hint, error, optional, labelled = 'shown', id, className, children }: Props) {
  const made = useId();
  const own = id ?? made;
  const described = [hint && `${own}-hint`, error && `${own}-error`].filter(Boolean).join(' ');
  return (
    <div className={className}>
      <label htmlFor={own} className={labelled === 'hidden' ? 'sr-only' : 'mb-1 block text-sm font-bold'}>
        {label}
        {optional && <span className="font-normal text-ink2"> · optional</span>}
      </label>
      {hint && (
        <div id={`${own}-hint`} className="mb-1.5 text-sm text-ink2">
          {hint}
        </div>
      )}
      {children({ id: own, 'aria-describedby': described || undefined, 'aria-invalid': error ? true : undefined })}
      {error && (
        <div id={`${own}-error`} className="mt-1 text-sm font-bold text-danger">
          {error}
        </div>
      )}
    </div>
  );
}

/** What every typed-into box looks like. On a phone its letters are 16 px, so that it does not zoom. */
export const inputLook =
  'w-full min-w-0 min-h-target rounded border-thin border-edge bg-surface px-3 py-1.5 text-base text-ink focus-visible:outline-offset-0 aria-invalid:border-danger aria-invalid:border-2 disabled:border-dashed disabled:text-ink2';
