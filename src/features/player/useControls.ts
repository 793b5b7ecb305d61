import { useCallback, useEffect, useRef, useState } from 'react';
import { type Playhead, usePlayState } from '../../lib/playhead';

/** After this long without a hand on it, the controls leave a full screen to the picture. */
const idleMs = 3000;

/**
 * Whether the controls are needed: always, but on a full screen that plays untouched.
 * @returns that, and what to call when a hand or a key is there
 */
export function useControls(playhead: Playhead, screen: 'full' | 'page'): ['shown' | 'hidden', () => void] {
  const { state } = usePlayState(playhead);
  const [hand, setHand] = useState<'near' | 'away'>('near');
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const touch = useCallback(() => {
    clearTimeout(timer.current);
    setHand('near');
    timer.current = setTimeout(() => setHand('away'), idleMs);
  }, []);
  useEffect(() => {
    if (screen === 'full') touch();
    return () => clearTimeout(timer.current);
  }, [screen, touch]);
  return [screen === 'full' && hand === 'away' && state === 'playing' ? 'hidden' : 'shown', touch];
}
