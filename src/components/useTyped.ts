import { useState } from 'react';

/**
 * Text that is taken over with every letter while it fits, and kept as it was typed while it does not.
 * @param commit takes the text, or says why not
 * @param onEmpty called when the field is left empty
 */
export function useTyped(value: string, commit: (text: string) => string | null, onEmpty?: () => void) {
  const [typed, setTyped] = useState<{ text: string; problem: string | null } | null>(null);
  return {
    text: typed?.text ?? value,
    problem: typed?.problem ?? undefined,
    type: (text: string) => setTyped({ text, problem: commit(text) }),
    leave: () => {
      if (typed?.text.trim() === '') onEmpty?.();
      setTyped(null);
    },
  };
}
