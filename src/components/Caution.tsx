import type { ReactNode } from 'react';

type Props = {
  /** one bold sentence that says what to do: “Clear the floor before you hop.” */
  todo: ReactNode;
  /** one plain sentence, such as when to stop */
  children?: ReactNode;
};

/** A caution looks like the edge of a step. */
export function Caution({ todo, children }: Props) {
  return (
    <div role="note" aria-label="Caution" className="caution bg-surface px-3 py-2.5 text-sm">
      <b>{todo}</b> {children}
    </div>
  );
}
