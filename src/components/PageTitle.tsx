import { type ReactNode, useEffect } from 'react';

type Props = {
  title: string;
  /** the tab's name, when it needs more than the heading says */
  tab?: string;
  /** a line beside or below: date, state, count */
  meta?: ReactNode;
  /** buttons at the end; the one yellow among them comes last */
  actions?: ReactNode;
};

/** The page's one first heading; it names the browser's tab too. */
export function PageTitle({ title, tab = title, meta, actions }: Props) {
  useEffect(() => {
    document.title = `${tab} · Tapeline`;
  }, [tab]);
  return (
    <header className="flex flex-wrap items-center gap-x-4 gap-y-2">
      <h1 className="text-xl font-black tracking-tight wrap-anywhere">{title}</h1>
      {meta && <div className="text-sm text-ink2">{meta}</div>}
      {actions && <div className="flex flex-wrap items-center gap-3 sm:ms-auto">{actions}</div>}
    </header>
  );
}

/** A part of a page, with its heading; `aside` sets a smaller one for a column at the side. */
export function Section({
  title,
  actions,
  place = 'main',
  children,
}: {
  title: string;
  actions?: ReactNode;
  place?: 'main' | 'aside';
  children: ReactNode;
}) {
  return (
    <section>
      <div className="mb-1.5 flex flex-wrap items-center gap-3">
        <h2 className={place === 'main' ? 'text-lg font-extrabold' : 'text-base font-extrabold'}>{title}</h2>
        {actions && <div className="ms-auto flex flex-wrap items-center gap-2">{actions}</div>}
      </div>
      {children}
    </section>
  );
}
