import { useEffect, useRef } from 'react';
import { useSearchParams } from 'react-router-dom';

export type Address = {
  search: URLSearchParams;
  /** sets one value in place; nothing takes it out */
  change: (name: string, value: string | undefined) => void;
};

/**
 * The values in the address, for a page whose parts change them at nearly the same time: the router takes a moment for each
 * change, so the next one builds on what was asked for last, not on what is shown.
 */
export function useAddress(): Address {
  const [search, setSearch] = useSearchParams();
  const asked = useRef(search.toString());
  useEffect(() => {
    asked.current = search.toString();
  }, [search]);
  const change = (name: string, value: string | undefined) => {
    const next = new URLSearchParams(asked.current);
    value === undefined ? next.delete(name) : next.set(name, value);
    asked.current = next.toString();
    setSearch(next, { replace: true });
  };
  return { search, change };
}
