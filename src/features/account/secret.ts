import { useState } from 'react';

/** The secret of a mailed link. It stands behind the `#`, so that no log and no referrer keeps it; once read it leaves the address bar. */
export function useSecret(): string {
  const [secret] = useState(() => decodeURIComponent(location.hash.slice(1)));
  return secret;
}
