import { type RefObject, useEffect } from 'react';
import { useBlocker } from 'react-router-dom';
import { ConfirmDialog } from '../../components/ConfirmDialog';

/** Asks before a page with unsaved changes is left. @param unsaved read at the moment of leaving */
export function UnsavedGuard({ unsaved }: { unsaved: RefObject<boolean> }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => unsaved.current && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    const ask = (event: BeforeUnloadEvent) => {
      if (unsaved.current) event.preventDefault();
    };
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [unsaved]);
  return (
    <ConfirmDialog
      open={blocker.state === 'blocked'}
      title="Leave without saving?"
      confirm="Leave"
      cancel="Stay here"
      onConfirm={() => blocker.proceed?.()}
      onClose={() => blocker.reset?.()}
    >
      What you changed of this movement is not saved yet, and is lost when you leave.
    </ConfirmDialog>
  );
}
