import { useEffect } from 'react';
import type { Playhead } from '../../lib/playhead';

const everyMs = 5000;
/** less is no change worth a request */
const leastMs = 500;

type Places = { keep(atMs: number): void; leave(atMs: number): void };

/** Keeps where one is: every few seconds while it plays, when it stops, and when the page is left. */
export function usePlace(playhead: Playhead, { keep, leave }: Places): void {
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
    let before = playhead.current().state;
    const follow = () => {
      const { state } = playhead.current();
      if (state === before) return;
      before = state;
      // where it starts is known already
      if (kept === null && state !== 'loading' && state !== 'broken') kept = playhead.atMs();
      if (state === 'paused' || state === 'ended') note();
    };
    const hide = () => {
      if (document.visibilityState === 'hidden') note();
    };
    const stop = playhead.subscribe(follow);
    const timer = setInterval(note, everyMs);
    document.addEventListener('visibilitychange', hide);
    window.addEventListener('pagehide', note);
    return () => {
      note();
      if (kept !== null) leave(kept);
      stop();
      clearInterval(timer);
      document.removeEventListener('visibilitychange', hide);
      window.removeEventListener('pagehide', note);
    };
  }, [playhead, keep, leave]);
}
