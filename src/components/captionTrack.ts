import type Player from 'video.js/dist/types/player';

export type CaptionState = 'shown' | 'hidden';

type TrackElement = { src: string; track: TextTrack };

/** One caption track, exchanged when its address changes. */
export function showCaptions(player: Player, url: string | null | undefined, state: CaptionState): void {
  const wanted = url ? new URL(url, location.href).href : null;
  const there = trackOf(player);
  const isSame = there !== undefined && new URL(there.src, location.href).href === wanted;
  // video.js's types know the list of these elements, not what an element holds
  if (there && !isSame) player.removeRemoteTextTrack(there.track as never);
  // cleaned up by hand: else the track would go with the next address of the picture
  if (wanted && !isSame)
    player.addRemoteTextTrack({ kind: 'captions', srclang: 'en', label: 'English', src: wanted }, true);
  const shown = trackOf(player);
  if (shown) shown.track.mode = state === 'shown' ? 'showing' : 'hidden';
}

function trackOf(player: Player): TrackElement | undefined {
  const list = player.remoteTextTrackEls() as unknown as { length: number; [index: number]: TrackElement };
  return list.length > 0 ? list[0] : undefined;
}
