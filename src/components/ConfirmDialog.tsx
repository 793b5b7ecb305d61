import type { ReactNode } from 'react';
import { Button } from './Button';
import { Dialog } from './Dialog';

type Props = {
  open: boolean;
  /** the question: “Take Ines out of the team?” */
  title: string;
  /** what will happen, and whether it can be undone */
  children: ReactNode;
  /** the verb of the question: “Take her out” */
  confirm: string;
  cancel?: string;
  onConfirm: () => void;
  onClose: () => void;
  busy?: string | undefined;
  error?: ReactNode;
};

/** Asks once before what cannot be undone. The safe way out has the focus, as the ARIA practices ask for. */
export function ConfirmDialog({
  open,
  title,
  children,
  confirm,
  cancel = 'Leave it',
  onConfirm,
  onClose,
  busy,
  error,
}: Props) {
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={title}
      actions={
        <>
          <Button data-first-focus onClick={onClose}>
            {cancel}
          </Button>
          <Button look="danger" busy={busy} onClick={onConfirm}>
            {confirm}
          </Button>
        </>
      }
    >
      {children}
      {error && (
        <p role="alert" className="mt-3 font-bold text-danger">
          {error}
        </p>
      )}
    </Dialog>
  );
}
