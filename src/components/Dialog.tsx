import { type ReactNode, useEffect, useId, useRef } from 'react';
import { IconButton } from './IconButton';

type Props = {
  open: boolean;
  /** by Escape, the cross, or the phone's way back; the caller then sets `open` to false */
  onClose: () => void;
  title: string;
  size?: 'regular' | 'wide';
  children: ReactNode;
  /** buttons at the foot, the one that does it last */
  actions?: ReactNode;
};

/** A window over the page, by the browser's own dialog: it keeps the focus inside and gives it back afterwards. */
export function Dialog({ open, onClose, title, size = 'regular', children, actions }: Props) {
  const window = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useEffect(() => {
    const dialog = window.current;
    if (!dialog || !open) return;
    if (!dialog.open) dialog.showModal();
    return () => dialog.close();
  }, [open]);

  if (!open) return null;
  return (
    <dialog
      ref={window}
      className="window"
      data-size={size}
      aria-labelledby={titleId}
      onCancel={(event) => {
        // an Escape inside a list of choices closes the list, not the window
        if (event.target !== event.currentTarget) return;
        event.preventDefault();
        onClose();
      }}
    >
      <div className="flex items-start gap-3 ps-5 pt-4 pe-3">
        <h2 id={titleId} className="grow pt-1 text-lg font-extrabold wrap-anywhere">
          {title}
        </h2>
        <IconButton icon="close" label="Close" look="quiet" size="small" onClick={onClose} />
      </div>
      <div className="px-5 pt-2 pb-5">{children}</div>
      {actions && (
        <div className="sticky bottom-0 flex flex-wrap justify-end gap-3 border-t-thin border-line bg-surface px-5 py-3.5">
          {actions}
        </div>
      )}
    </dialog>
  );
}
