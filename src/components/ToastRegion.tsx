import { Button } from './Button';
import { IconButton } from './IconButton';
import { closeToast, useToasts } from './toasts';

/** Once in the application, after the pages. Over the floor's navigation, in the corner of the desk. */
export function ToastRegion() {
  const toasts = useToasts();
  return (
    <section
      aria-label="News"
      aria-live="polite"
      className="pointer-events-none fixed inset-x-3 bottom-[calc(var(--nav)+0.75rem)] z-40 flex flex-col items-end gap-2"
    >
      {toasts.map((toast) => (
        <div
          key={toast.id}
          className="pointer-events-auto flex w-full max-w-md items-center gap-2 rounded border-thin border-edge bg-surface py-1.5 ps-4 pe-1.5"
        >
          <p className="grow py-1 font-bold">{toast.text}</p>
          {toast.action && (
            <Button
              size="small"
              onClick={() => {
                closeToast(toast.id);
                toast.action?.onSelect();
              }}
            >
              {toast.action.label}
            </Button>
          )}
          <IconButton icon="close" label="Close" look="quiet" size="small" onClick={() => closeToast(toast.id)} />
        </div>
      ))}
    </section>
  );
}
