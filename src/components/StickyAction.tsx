import type { ReactNode } from 'react';

/** Holds the one thing to do at the thumb, on a short page too; the last child of a floor page, not wrapped with the rest. */
export function StickyAction({ children }: { children: ReactNode }) {
  return (
    <div className="sticky-action sticky bottom-[var(--nav)] z-20 -mx-4.5 mt-auto flex flex-col bg-ground px-4.5 pt-3 pb-3 md:mx-0 md:px-0">
      {children}
    </div>
  );
}
