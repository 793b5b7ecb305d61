import type { KeyboardEvent, ReactNode } from 'react';

/** Buttons of one row as one stop of the Tab key, by arrows from one to the next (ARIA Authoring Practices, toolbar). */
export function Toolbar({ label, className, children }: { label: string; className?: string; children: ReactNode }) {
  const move = (event: KeyboardEvent<HTMLDivElement>) => {
    const step = event.key === 'ArrowRight' ? 1 : event.key === 'ArrowLeft' ? -1 : 0;
    if (step === 0) return;
    const buttons = [...event.currentTarget.querySelectorAll<HTMLButtonElement>('button:enabled')];
    const at = buttons.indexOf(document.activeElement as HTMLButtonElement);
    event.preventDefault();
    buttons[(at + step + buttons.length) % buttons.length]?.focus();
  };
  return (
    <div role="toolbar" aria-label={label} className={className} onKeyDown={move}>
      {children}
    </div>
  );
}
