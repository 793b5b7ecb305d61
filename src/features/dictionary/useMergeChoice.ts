import { useEffect, useState } from 'react';
import { Id } from '../../../shared/domain/values';
import type { Address } from './useAddress';

export type MergeChoice = {
  /** null while nobody merges */
  chosen: readonly string[] | null;
  start: () => void;
  toggle: (id: string) => void;
  stop: () => void;
};

/** Two movements to merge, kept in the address: looking for the second one does not lose the first. */
export function useMergeChoice({ search, change }: Address): MergeChoice {
  const text = search.get('merge');
  // the address follows a moment later: a box that is ticked shows it at once
  const [chosen, setChosen] = useState(() => read(text));
  useEffect(() => setChosen(read(text)), [text]);
  const set = (next: readonly string[] | null) => {
    setChosen(next);
    change('merge', next?.join(','));
  };
  return {
    chosen,
    start: () => set([]),
    toggle: (id) => set(chosen?.includes(id) ? chosen.filter((other) => other !== id) : [...(chosen ?? []), id]),
    stop: () => set(null),
  };
}

function read(text: string | null): readonly string[] | null {
  if (text === null) return null;
  return [...new Set(text.split(',').filter((id) => Id.safeParse(id).success))].slice(0, 2);
}
