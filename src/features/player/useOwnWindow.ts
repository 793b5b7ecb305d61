import { useCallback } from 'react';
import type { Playhead } from '../../lib/playhead';

/** The picture in a small window of its own, over other programs, where the platform has that. */
export function useOwnWindow(playhead: Playhead) {
  const toggle = useCallback(async () => {
    if (document.pictureInPictureElement) return document.exitPictureInPicture();
    // refused while nothing is loaded: the button can be pressed again
    await playhead
      .video()
      ?.requestPictureInPicture()
      .catch(() => undefined);
  }, [playhead]);
  return { isOffered: document.pictureInPictureEnabled === true, toggle };
}
