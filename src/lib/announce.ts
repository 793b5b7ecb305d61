import { useSyncExternalStore } from 'react';

/** Sentences for screen readers about what changed without the focus moving: “6 results”, “Saved”. */

let said = { text: '', count: 0 };
const listeners = new Set<() => void>();

/** Reads a sentence out politely. The same sentence twice in a row is read twice. */
export function announce(text: string): void {
  said = { text, count: said.count + 1 };
  for (const listener of listeners) listener();
}

export function useAnnouncement(): { text: string; count: number } {
  return useSyncExternalStore(
    (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    () => said,
  );
}
