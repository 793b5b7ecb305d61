import { clsx } from 'clsx';
import { type KeyboardEvent, type ReactNode, useId, useRef } from 'react';

export type Tab<Name extends string> = { name: Name; label: ReactNode; panel: ReactNode };

type Props<Name extends string> = {
  label: string;
  tabs: readonly Tab<Name>[];
  at: Name;
  onChange: (name: Name) => void;
};

/** Views of one thing, one at a time (ARIA tabs; arrows move, Home and End jump). Pages are links instead. */
export function Tabs<Name extends string>({ label, tabs, at, onChange }: Props<Name>) {
  const id = useId();
  const list = useRef<HTMLDivElement>(null);
  const current = tabs.findIndex((tab) => tab.name === at);

  const move = (event: KeyboardEvent) => {
    const to = { ArrowRight: current + 1, ArrowLeft: current - 1, Home: 0, End: tabs.length - 1 }[event.key];
    const tab = to === undefined ? undefined : tabs[(to + tabs.length) % tabs.length];
    if (!tab) return;
    event.preventDefault();
    onChange(tab.name);
    list.current?.querySelector<HTMLElement>(`[data-name="${tab.name}"]`)?.focus();
  };

  return (
    <>
      <div
        ref={list}
        role="tablist"
        aria-label={label}
        className="flex gap-5 overflow-x-auto border-b-thin border-line"
        onKeyDown={move}
      >
        {tabs.map((tab) => (
          <button
            key={tab.name}
            id={`${id}-${tab.name}`}
            data-name={tab.name}
            type="button"
            role="tab"
            aria-selected={tab.name === at}
            aria-controls={`${id}-panel`}
            tabIndex={tab.name === at ? 0 : -1}
            className={clsx(
              'min-h-target flex-none border-b-4 px-0.5 text-sm font-bold whitespace-nowrap focus-visible:outline-offset-[-3px]',
              tab.name === at ? 'border-yellow text-ink' : 'border-transparent text-ink2 hover:text-ink',
            )}
            onClick={() => onChange(tab.name)}
          >
            {tab.label}
          </button>
        ))}
      </div>
      {/* biome-ignore lint/a11y/noNoninteractiveTabindex: the ARIA practices make a panel a stop of its own */}
      <div id={`${id}-panel`} role="tabpanel" aria-labelledby={`${id}-${at}`} tabIndex={0} className="pt-4">
        {tabs[current]?.panel}
      </div>
    </>
  );
}
