import { useEffect } from 'react';
import { type Playhead, usePlayState } from '../../lib/playhead';

/** Keeps the screen awake while it plays, where the platform can: hands are on the floor. */
export function useWakeLock(playhead: Playhead): void {
  const isPlaying = usePlayState(playhead).state === 'playing';
  useEffect(() => {
    if (!isPlaying || !('wakeLock' in navigator)) return;
    let lock: WakeLockSentinel | null = null;
    let gone = false;
    const ask = async () => {
      if (document.visibilityState !== 'visible') return;
      // refused when the battery is low: the screen then sleeps as it always does
      const given = await navigator.wakeLock.request('screen').catch(() => null);
      if (gone) await given?.release();
      else lock = given;
    };
    void ask();
    document.addEventListener('visibilitychange', ask);
    return () => {
      gone = true;
      document.removeEventListener('visibilitychange', ask);
      void lock?.release();
    };
  }, [isPlaying]);
}
