import { type ReactNode, useEffect } from 'react';
import { TapeStrip } from './TapeStrip';

type Props = {
  /** “There is nothing here” */
  title: string;
  children?: ReactNode;
  requestId?: string | undefined;
  /** the way on: a GoLink to where one belongs, a button to try again */
  actions?: ReactNode;
};

/** A whole page that says what went wrong and where to go. Lies inside a layout, or alone. */
export function ErrorPage({ title, children, requestId, actions }: Props) {
  useEffect(() => {
    document.title = `${title} · Tapeline`;
  }, [title]);
  return (
    <div className="mx-auto max-w-lg px-5 py-16">
      <div className="mb-6 flex gap-1.5" aria-hidden="true">
        <TapeStrip kind="workout" size="tall" className="w-1/3" />
        <TapeStrip kind="aside" size="tall" className="w-1/4" />
        <TapeStrip kind="workout" size="tall" className="grow" />
      </div>
      <h1 className="text-xl font-black tracking-tight">{title}</h1>
      {children && <div className="mt-2 text-md text-ink2">{children}</div>}
      {requestId && (
        <p className="mt-3 text-sm text-ink2">
          Number to tell the owner: <span className="font-bold wrap-anywhere select-all">{requestId}</span>
        </p>
      )}
      {actions && <div className="mt-6 flex flex-wrap gap-3">{actions}</div>}
    </div>
  );
}
