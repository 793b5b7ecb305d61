import type { ReactNode } from 'react';
import { TapeStrip } from './TapeStrip';

type Props = {
  /** what is not there, in a sentence: “No session for today.” */
  title: string;
  /** what to do next */
  children?: ReactNode;
  action?: ReactNode;
};

/** An empty list says what to do next, over a line where the tape would lie. */
export function EmptyState({ title, children, action }: Props) {
  return (
    <div className="max-w-prose py-6">
      <TapeStrip kind="plain" laid="empty" className="mb-3 w-24" />
      <p className="text-md font-extrabold">{title}</p>
      {children && <div className="mt-1 text-ink2">{children}</div>}
      {action && <div className="mt-4 flex flex-wrap gap-3">{action}</div>}
    </div>
  );
}
