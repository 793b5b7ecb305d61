import type { ReactNode } from 'react';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { Key } from '../../components/Key';

type Props = {
  state: 'unchanged' | 'changed' | 'saving' | 'saved';
  fault: string | null;
  save: string;
  saving: string;
  children?: ReactNode;
};

/** Stays at the foot of a long form: whether it is kept, and the button that keeps it. */
export function SaveBar({ state, fault, save, saving, children }: Props) {
  return (
    <div className="sticky-action sticky bottom-0 z-10 -mx-1 mt-5 flex flex-wrap items-center gap-x-4 gap-y-1 border-t-thin border-line bg-ground px-1 py-2.5">
      <GoButton
        type="submit"
        disabled={state === 'unchanged' || state === 'saved'}
        busy={state === 'saving' ? saving : undefined}
      >
        {save}
        <span className="max-sm:hidden">
          <Key name="Mod+s" />
        </span>
      </GoButton>
      <p role="status" className="text-sm font-extrabold">
        {state === 'saved' && <span className="text-good">Saved</span>}
        {state === 'changed' && <span className="text-ink2">Not saved yet</span>}
      </p>
      {children}
      <FormFault>{fault}</FormFault>
    </div>
  );
}
