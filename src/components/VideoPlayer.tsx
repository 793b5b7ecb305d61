import { clsx } from 'clsx';
import { type ReactNode, useEffect, useRef } from 'react';
import type Player from 'video.js/dist/types/player';
import type { Playhead } from '../lib/playhead';
import { type CaptionState, showCaptions } from './captionTrack';
import { connectPicture } from './pictureMedia';
import { loadVideoEngine } from './videoEngine';

type Props = {
  playhead: Playhead;
  source: { url: string; type: string };
  posterUrl?: string | null;
  /** frames a second: seeks land inside the wanted frame */
  fps: number;
  /** what the picture shows, for screen readers */
  label: string;
  /** the recording's own size; 16 by 9 without it */
  shape?: { width: number; height: number };
  /** address of a WebVTT file; changes when the captions were saved */
  captionsUrl?: string | null;
  captions?: CaptionState;
  picture?: 'as filmed' | 'mirrored';
  /** asked for when the source's address does not work any more; a new `source` then goes on at the same place */
  onExpired?: () => void;
  className?: string;
  /** laid over the picture */
  children?: ReactNode;
};

type Shown = { player: Player; connection: ReturnType<typeof connectPicture>; url: string };

/** The picture. It has no controls of its own: whoever places it gives it a playhead and draws them. */
export function VideoPlayer(props: Props) {
  const { playhead, source, posterUrl, label, shape, captionsUrl, captions = 'hidden', picture = 'as filmed' } = props;
  const place = useRef<HTMLDivElement>(null);
  const shown = useRef<Shown | null>(null);
  const latest = useRef(props);
  useEffect(() => {
    latest.current = props;
  });

  useEffect(() => {
    let gone = false;
    const element = document.createElement('video');
    element.playsInline = true;
    element.className = 'video-js';
    place.current?.append(element);
    loadVideoEngine().then(
      (videojs) => {
        if (gone) return;
        const player = videojs(element, bare);
        const connection = connectPicture(player, playhead, () => latest.current);
        shown.current = { player, connection, url: latest.current.source.url };
        tellOf(player, latest.current);
        connection.load(latest.current.source);
      },
      () => {
        if (!gone) playhead.report({ state: 'broken', fault: 'The player did not arrive. Load the page again.' });
      },
    );
    return () => {
      gone = true;
      shown.current?.connection.end();
      if (shown.current) shown.current.player.dispose();
      else element.remove();
      shown.current = null;
    };
  }, [playhead]);

  // another address for the same recording goes on where the old one stopped
  useEffect(() => {
    if (!shown.current || shown.current.url === source.url) return;
    shown.current.url = source.url;
    shown.current.connection.load({ url: source.url, type: source.type });
  }, [source.url, source.type]);

  useEffect(() => {
    if (shown.current) tellOf(shown.current.player, { captionsUrl, captions, posterUrl, label });
  }, [captionsUrl, captions, posterUrl, label]);

  return (
    <div
      className={clsx('picture relative overflow-hidden', props.className)}
      style={{ aspectRatio: shape ? `${shape.width} / ${shape.height}` : '16 / 9' }}
      data-picture={picture}
    >
      <div ref={place} className="absolute inset-0" />
      {props.children}
    </div>
  );
}

/** Only the picture: no part of video.js that can be pressed or that speaks. */
const bare = {
  controls: false,
  fill: true,
  preload: 'auto',
  controlBar: false,
  bigPlayButton: false,
  errorDisplay: false,
  loadingSpinner: false,
  // its poster would cover a frame that was sought before playing; the element's own goes away by itself
  posterImage: false,
  textTrackSettings: false,
  userActions: { click: false, doubleClick: false, hotkeys: false },
} as const;

function tellOf(
  player: Player,
  {
    captionsUrl,
    captions = 'hidden',
    posterUrl,
    label,
  }: Pick<Props, 'captionsUrl' | 'captions' | 'posterUrl' | 'label'>,
): void {
  showCaptions(player, captionsUrl, captions);
  player.el()?.setAttribute('aria-label', label);
  const video = player.$('video');
  if (posterUrl) video?.setAttribute('poster', posterUrl);
  else video?.removeAttribute('poster');
}
