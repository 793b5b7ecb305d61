import { useEffect, useRef, useState } from 'react';
import { useBlocker } from 'react-router-dom';
import type { KeptDocument } from './keptDocument';

/** A question that is open while somebody wants to leave with unsaved changes. */
export type LeaveQuestion = { leave: () => void; stay: () => void };

// biome-ignore lint/suspicious/noExplicitAny: whatever the documents hold
type Documents = readonly KeptDocument<any>[];

/**
 * Leaving with unsaved changes: they are saved first, and only when that does not work somebody is asked.
 * Closing the tab cannot wait, so there the browser asks. Once a page: the router keeps one blocker.
 */
export function useLeaveGuard(documents: Documents): LeaveQuestion | null {
  const latest = useRef(documents);
  useEffect(() => {
    latest.current = documents;
  });
  const unsaved = () => latest.current.some((kept) => kept.isUnsaved());
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => currentLocation.pathname !== nextLocation.pathname && unsaved(),
  );
  const [asked, setAsked] = useState<'no' | 'yes'>('no');

  useEffect(() => {
    const ask = (event: BeforeUnloadEvent) => {
      if (latest.current.some((kept) => kept.isUnsaved())) event.preventDefault();
    };
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, []);

  useEffect(() => {
    if (blocker.state !== 'blocked') {
      setAsked('no');
      return;
    }
    let gone = false;
    void Promise.all(latest.current.map((kept) => kept.flush())).then((saved) => {
      if (gone) return;
      if (saved.every(Boolean)) blocker.proceed();
      else setAsked('yes');
    });
    return () => {
      gone = true;
    };
  }, [blocker]);

  if (blocker.state !== 'blocked' || asked === 'no') return null;
  return { leave: () => blocker.proceed(), stay: () => blocker.reset() };
}
