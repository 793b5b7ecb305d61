import { type ReactNode, useId, useLayoutEffect, useRef } from 'react';
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

/**
 * A window over the page, by the browser's own dialog: it keeps the focus inside and gives it back afterwards.
 * The focus starts on what has `data-first-focus`, else in the first field.
 */
export function Dialog({ open, ...rest }: Props) {
  return open ? <OpenDialog {...rest} /> : null;
}

/** A component of its own, so that it is closed before it is taken out: else the focus would be lost. */
function OpenDialog({ onClose, title, size = 'regular', children, actions }: Omit<Props, 'open'>) {
  const window = useRef<HTMLDialogElement>(null);
  const titleId = useId();
  useLayoutEffect(() => {
    const dialog = window.current;
    dialog?.showModal();
    const first =
      dialog?.querySelector<HTMLElement>('[data-first-focus]') ??
      dialog?.querySelector<HTMLElement>(':is(input, textarea, select):not(:disabled)');
    first?.focus();
    return () => dialog?.close();
  }, []);

  return (
    <dialog
      ref={window}
      className="window"
      data-size={size}
      aria-labelledby={titleId}
      onCancel={(event) => {
        // a file picker inside cancels too, and its event bubbles
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
