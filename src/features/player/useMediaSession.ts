import { useEffect, useRef } from 'react';
import { type Playhead, useAtMs, usePlayState } from '../../lib/playhead';
import type { Moves } from './moves';

type Shown = { title: string; artist: string; album: string; pictureUrl: string | null };

/** What plays, on the lock screen and on headphones' buttons, where the platform has a media session. */
export function useMediaSession(playhead: Playhead, { title, artist, album, pictureUrl }: Shown, moves: Moves): void {
  const { state, rate, durationMs } = usePlayState(playhead);
  const atMs = useAtMs(playhead, 1000);
  const latest = useRef(moves);
  useEffect(() => {
    latest.current = moves;
  });

  useEffect(() => {
    if (!('mediaSession' in navigator)) return;
    navigator.mediaSession.metadata = new MediaMetadata({
      title,
      artist,
      album,
      artwork: pictureUrl ? [{ src: pictureUrl }] : [],
    });
    return () => {
      navigator.mediaSession.metadata = null;
    };
  }, [title, artist, album, pictureUrl]);

  useEffect(() => {
    if (!('mediaSession' in navigator)) return;
    navigator.mediaSession.playbackState = state === 'playing' || state === 'waiting' ? 'playing' : 'paused';
    if (durationMs > 0)
      navigator.mediaSession.setPositionState({
        duration: durationMs / 1000,
        playbackRate: rate,
        position: Math.min(atMs, durationMs) / 1000,
      });
  }, [state, rate, durationMs, atMs]);

  useEffect(() => {
    if (!('mediaSession' in navigator)) return;
    const handlers: [MediaSessionAction, MediaSessionActionHandler][] = [
      ['play', () => playhead.play()],
      ['pause', () => playhead.pause()],
      ['previoustrack', () => latest.current.previous()],
      ['nexttrack', () => latest.current.next()],
      ['seekbackward', ({ seekOffset }) => latest.current.by(-(seekOffset ?? 5) * 1000)],
      ['seekforward', ({ seekOffset }) => latest.current.by((seekOffset ?? 5) * 1000)],
      ['seekto', ({ seekTime }) => seekTime !== undefined && playhead.seekTo(seekTime * 1000)],
    ];
    const set = (action: MediaSessionAction, handler: MediaSessionActionHandler | null) => {
      try {
        navigator.mediaSession.setActionHandler(action, handler);
      } catch {
        // a platform throws on actions that it does not know
      }
    };
    for (const [action, handler] of handlers) set(action, handler);
    return () => {
      for (const [action] of handlers) set(action, null);
    };
  }, [playhead]);
}
