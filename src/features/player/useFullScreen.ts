import { type RefObject, useCallback, useSyncExternalStore } from 'react';
import type { Playhead } from '../../lib/playhead';

/** iPhones give the whole screen to the picture alone, under names of their own. */
type PhoneVideo = HTMLVideoElement & { webkitEnterFullscreen?: () => void; webkitSupportsFullscreen?: boolean };

const subscribe = (listener: () => void) => {
  document.addEventListener('fullscreenchange', listener);
  return () => document.removeEventListener('fullscreenchange', listener);
};

/** The player over the whole screen, and back. */
export function useFullScreen(stage: RefObject<HTMLElement | null>, playhead: Playhead) {
  const isFull = useSyncExternalStore(subscribe, () => document.fullscreenElement !== null);
  const toggle = useCallback(async () => {
    if (document.fullscreenElement) return document.exitFullscreen();
    // a refusal (a frame's policy, no press before it) leaves everything as it was
    if (document.fullscreenEnabled) return stage.current?.requestFullscreen().catch(() => undefined);
    (playhead.video() as PhoneVideo | null)?.webkitEnterFullscreen?.();
  }, [stage, playhead]);
  const isOffered = document.fullscreenEnabled || 'webkitEnterFullscreen' in HTMLVideoElement.prototype;
  return { isFull, isOffered, toggle };
}
