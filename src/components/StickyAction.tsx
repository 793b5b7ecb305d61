import type { ReactNode } from 'react';

/** Holds the one thing to do at the thumb while the page scrolls; the last thing in a floor page. */
export function StickyAction({ children }: { children: ReactNode }) {
  return (
    <div className="sticky bottom-[var(--nav)] z-20 -mx-4.5 mt-4 flex flex-col bg-ground px-4.5 pt-3 pb-3 md:mx-0 md:px-0">
      {children}
    </div>
  );
}
