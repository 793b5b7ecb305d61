import { useState } from 'react';
import { readStored, writeStored } from '../../lib/stored';

const key = 'tapeline.captions';

/** Captions are shown until somebody switches them off; this browser remembers. */
export function useCaptionChoice(): ['shown' | 'hidden', () => void] {
  const [choice, setChoice] = useState<'shown' | 'hidden'>(() => (readStored(key) === 'hidden' ? 'hidden' : 'shown'));
  const toggle = () => {
    const next = choice === 'shown' ? 'hidden' : 'shown';
    writeStored(key, next);
    setChoice(next);
  };
  return [choice, toggle];
}
