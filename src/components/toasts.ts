import { useSyncExternalStore } from 'react';

export type Toast = {
  id: number;
  text: string;
  /** something to do about it; the toast then stays until it is closed (WCAG 2.2 SC 2.2.1) */
  action?: { label: string; onSelect: () => void } | undefined;
};

/** Long enough to read two sentences twice. */
const shownMs = 8000;

let toasts: readonly Toast[] = [];
let lastId = 0;
const listeners = new Set<() => void>();

function set(next: readonly Toast[]): void {
  toasts = next;
  for (const listener of listeners) listener();
}

/** Tells of something that happened elsewhere: an upload is done, somebody answered. Errors belong at their field or in their place. */
export function tell(text: string, action?: Toast['action']): void {
  lastId += 1;
  const id = lastId;
  set([...toasts.slice(-2), { id, text, action }]);
  if (!action) setTimeout(() => closeToast(id), shownMs);
}

export function closeToast(id: number): void {
  if (toasts.some((toast) => toast.id === id)) set(toasts.filter((toast) => toast.id !== id));
}

export function useToasts(): readonly Toast[] {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => toasts,
  );
}
