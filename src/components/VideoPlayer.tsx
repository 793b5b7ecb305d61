import { clsx } from 'clsx';
import { type ReactNode, useEffect, useRef } from 'react';
import type Player from 'video.js/dist/types/player';
import type { Playhead, PlayState } from '../lib/playhead';
import { loadVideoEngine } from './videoEngine';

type Props = {
  playhead: Playhead;
  source: { url: string; type: string };
  posterUrl?: string | null;
  /** frames a second: seeks land in the middle of the wanted frame */
  fps: number;
  /** what the picture shows, for screen readers */
  label: string;
  /** address of a WebVTT file; changes when the captions were saved */
  captionsUrl?: string | null;
  captions?: 'shown' | 'hidden';
  picture?: 'as filmed' | 'mirrored';
  /** asked for when the source's address does not work any more; a new `source` then goes on at the same place */
  onExpired?: () => void;
  className?: string;
  /** laid over the picture */
  children?: ReactNode;
};

/** The picture. It has no controls of its own: whoever places it gives it a playhead and draws them. */
export function VideoPlayer(props: Props) {
  const {
    playhead,
    source,
    posterUrl,
    fps,
    label,
    captionsUrl,
    captions = 'hidden',
    picture = 'as filmed',
    className,
    children,
  } = props;
  const place = useRef<HTMLDivElement>(null);
  const player = useRef<Player | null>(null);
  const latest = useRef(props);
  latest.current = props;

  useEffect(() => {
    let gone = false;
    let frame = 0;
    const element = document.createElement('video');
    element.playsInline = true;
    element.className = 'video-js';
    place.current?.prepend(element);
    void loadVideoEngine().then((videojs) => {
      if (gone) return;
      const { source: first, posterUrl: poster, label: name } = latest.current;
      const made = videojs(element, {
        controls: false,
        fill: true,
        preload: 'auto',
        bigPlayButton: false,
        errorDisplay: false,
        loadingSpinner: false,
        textTrackSettings: false,
        userActions: { click: false, doubleClick: false, hotkeys: false },
        html5: { nativeTextTracks: false },
        ...(poster ? { poster } : {}),
      });
      player.current = made;
      made.el()?.setAttribute('aria-label', name);
      const middleOfFrame = (ms: number) =>
        (Math.floor((ms / 1000) * latest.current.fps + 1e-6) + 0.5) / latest.current.fps;
      playhead.attach({
        currentMs: () => Math.round((made.currentTime() ?? 0) * 1000),
        seekTo: (ms) => {
          const end = made.duration() ?? 0;
          made.currentTime(end > 0 ? Math.min(middleOfFrame(ms), Math.max(0, end - 0.001)) : middleOfFrame(ms));
        },
        // a browser may refuse to start with sound before the first touch: it then stays paused
        play: () => void Promise.resolve(made.play()).catch(() => undefined),
        pause: () => made.pause(),
        setRate: (rate) => void made.playbackRate(rate),
      });
      const say = (state: PlayState) => playhead.report({ state });
      const settled = () => say(made.paused() ? 'paused' : 'playing');
      made.on('loadedmetadata', () => {
        playhead.report({
          durationMs: Math.round((made.duration() ?? 0) * 1000),
          state: made.paused() ? 'paused' : 'playing',
          fault: null,
        });
        element.preservesPitch = true;
      });
      made.on('play', () => say('playing'));
      made.on('pause', () => say('paused'));
      made.on('waiting', () => say('waiting'));
      made.on(['playing', 'seeked', 'canplay'], settled);
      made.on('ended', () => say('ended'));
      made.on('ratechange', () => playhead.report({ rate: made.playbackRate() ?? 1 }));
      made.on(['timeupdate', 'seeking', 'seeked', 'loadedmetadata'], () => playhead.tick());
      made.on('error', () => {
        playhead.report({ state: 'broken', fault: 'The picture does not arrive. Check the connection.' });
        latest.current.onExpired?.();
      });
      // timeupdate comes four times a second, too seldom for a moving playhead
      const follow = () => {
        frame = requestAnimationFrame(follow);
        if (!made.paused()) playhead.tick();
      };
      follow();
      made.src({ src: first.url, type: first.type });
      showCaptions(made, latest.current.captionsUrl, latest.current.captions ?? 'hidden');
    });
    return () => {
      gone = true;
      cancelAnimationFrame(frame);
      playhead.attach(null);
      if (player.current) player.current.dispose();
      else element.remove();
      player.current = null;
    };
  }, [playhead]);

  // another address for the same recording goes on where the old one stopped
  const shownUrl = useRef(source.url);
  useEffect(() => {
    const current = player.current;
    if (!current || shownUrl.current === source.url) {
      shownUrl.current = source.url;
      return;
    }
    shownUrl.current = source.url;
    const at = playhead.atMs();
    const wasPlaying = !current.paused();
    playhead.report({ state: 'loading', fault: null });
    playhead.seekTo(at);
    current.src({ src: source.url, type: source.type });
    if (wasPlaying) void Promise.resolve(current.play()).catch(() => undefined);
  }, [source.url, source.type, playhead]);

  useEffect(() => {
    if (player.current) showCaptions(player.current, captionsUrl, captions);
  }, [captionsUrl, captions]);

  useEffect(() => {
    if (player.current && posterUrl) player.current.poster(posterUrl);
  }, [posterUrl]);

  useEffect(() => {
    player.current?.el()?.setAttribute('aria-label', label);
  }, [label]);

  return (
    <div
      className={clsx('picture relative aspect-video overflow-hidden', className)}
      data-picture={picture}
      data-fps={fps}
    >
      <div ref={place} className="absolute inset-0" />
      {children}
    </div>
  );
}

/** One caption track, exchanged when its address changes. */
function showCaptions(player: Player, url: string | null | undefined, state: 'shown' | 'hidden'): void {
  const list = player.remoteTextTrackEls() as unknown as {
    length: number;
    [index: number]: { src: string; track: TextTrack };
  };
  const shown = Array.from({ length: list.length }, (_, index) => list[index]).find(Boolean);
  const wanted = url ? new URL(url, location.href).href : null;
  if (shown && (wanted === null || new URL(shown.src, location.href).href !== wanted))
    player.removeRemoteTextTrack(shown.track as never);
  else if (shown) {
    shown.track.mode = state === 'shown' ? 'showing' : 'hidden';
    return;
  }
  if (!wanted) return;
  const added = player.addRemoteTextTrack(
    { kind: 'captions', srclang: 'en', label: 'English', src: wanted },
    false,
  ) as unknown as {
    track: TextTrack;
  };
  added.track.mode = state === 'shown' ? 'showing' : 'hidden';
}
