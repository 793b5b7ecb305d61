import { useSearchParams } from 'react-router-dom';
import { Id } from '../../../shared/domain/values';

export type MergeChoice = {
  /** null while nobody merges */
  chosen: readonly string[] | null;
  start: () => void;
  toggle: (id: string) => void;
  stop: () => void;
};

/** Two movements to merge, kept in the address: looking for the second one does not lose the first. */
export function useMergeChoice(): MergeChoice {
  const [search, setSearch] = useSearchParams();
  const text = search.get('merge');
  const ids = (text ?? '').split(',').filter((id) => Id.safeParse(id).success);
  const chosen = text === null ? null : [...new Set(ids)].slice(0, 2);
  const set = (next: readonly string[] | null) =>
    setSearch(
      (before) => {
        const params = new URLSearchParams(before);
        next ? params.set('merge', next.join(',')) : params.delete('merge');
        return params;
      },
      { replace: true },
    );
  return {
    chosen,
    start: () => set([]),
    toggle: (id) => set(chosen?.includes(id) ? chosen.filter((other) => other !== id) : [...(chosen ?? []), id]),
    stop: () => set(null),
  };
}
