import { useEffect } from 'react';
import type { Playhead } from '../../lib/playhead';

const everyMs = 5000;
/** less is no change worth a request */
const leastMs = 500;

/** Keeps where one is: every few seconds while it plays, when it stops, and when the page is left. */
export function usePlace(playhead: Playhead, keep: (atMs: number) => void): void {
  useEffect(() => {
    let kept: number | null = null;
    const note = () => {
      const { state } = playhead.current();
      if (state === 'loading' || state === 'broken') return;
      const at = playhead.atMs();
      if (kept === null || Math.abs(at - kept) < leastMs) return;
      kept = at;
      keep(at);
    };
    const follow = () => {
      const { state } = playhead.current();
      // where it starts is known already
      if (kept === null && state !== 'loading' && state !== 'broken') kept = playhead.atMs();
      if (state === 'paused' || state === 'ended') note();
    };
    const hide = () => {
      if (document.visibilityState === 'hidden') note();
    };
    const stop = playhead.subscribe(follow);
    const timer = setInterval(() => {
      if (playhead.current().state === 'playing') note();
    }, everyMs);
    document.addEventListener('visibilitychange', hide);
    window.addEventListener('pagehide', note);
    return () => {
      note();
      stop();
      clearInterval(timer);
      document.removeEventListener('visibilitychange', hide);
      window.removeEventListener('pagehide', note);
    };
  }, [playhead, keep]);
}
