import { useEffect, useState } from 'react';

/** A value once it has stayed the same for a while, so that every letter typed does not ask the server. */
export function useSettled<T>(value: T, afterMs = 120): T {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), afterMs);
    return () => clearTimeout(timer);
  }, [value, afterMs]);
  return settled;
}
