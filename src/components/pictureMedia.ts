import type Player from 'video.js/dist/types/player';
import type { Playhead, PlayState } from '../lib/playhead';

type Source = { url: string; type: string };
type Wanted = { source: Source; fps: number; onExpired?: (() => void) | undefined };

/** A broken connection is tried again after these waits, the last one over and over. */
const retryMs = [1000, 2000, 4000, 8000, 15_000] as const;

/** A seek that follows another waits for its frame, else a moving finger would see none; but no longer than this. */
const frameWaitMs = 250;

/**
 * Ties a video.js player to a playhead: what it does is reported, what is asked of it is done.
 * @param latest what is wanted at the moment it is asked
 * @returns `load` to show another address at the same place, `end` to let go
 */
export function connectPicture(player: Player, playhead: Playhead, latest: () => Wanted) {
  const video = () => (player.$('video') as HTMLVideoElement | null) ?? null;
  const seeks = seekOneByOne(player, () => latest().fps);
  let tries = 0;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let frame = 0;

  const load = ({ url, type }: Source) => {
    clearTimeout(timer);
    const at = playhead.atMs();
    seeks.forget();
    if (playhead.current().state !== 'broken') playhead.report({ state: 'loading', frame: 'awaited' });
    // nothing is sought at the very start, where the poster stands
    if (at > 0) playhead.seekTo(at);
    player.src({ src: url, type });
  };
  const retry = () => {
    tries += 1;
    load(latest().source);
  };
  const retryOnline = () => {
    if (playhead.current().state === 'broken') retry();
  };

  const say = (state: PlayState) => {
    if (player.error() || player.readyState() < 1) return;
    playhead.report({ state });
  };
  const settled = () => say(player.ended() ? 'ended' : player.paused() ? 'paused' : 'playing');
  // timeupdate comes four times a second, too seldom for a moving playhead
  const follow = () => {
    cancelAnimationFrame(frame);
    playhead.tick();
    if (!player.paused()) frame = requestAnimationFrame(follow);
  };
  const heard = () => playhead.report({ volume: player.volume() ?? 1, sound: player.muted() ? 'muted' : 'on' });

  player.on('loadedmetadata', () => {
    tries = 0;
    playhead.report({
      durationMs: Math.round((player.duration() ?? 0) * 1000),
      state: player.paused() ? 'paused' : 'playing',
      fault: null,
    });
    heard();
  });
  player.on('play', () => {
    say('playing');
    follow();
  });
  player.on('pause', () => say('paused'));
  player.on('waiting', () => say('waiting'));
  player.on(['playing', 'seeked', 'canplay'], settled);
  player.on('ended', () => say('ended'));
  player.on(['seeking', 'waiting'], () => playhead.report({ frame: 'awaited' }));
  player.on(['loadeddata', 'seeked', 'playing'], () => playhead.report({ frame: 'shown' }));
  player.on('ratechange', () => playhead.report({ rate: player.playbackRate() ?? 1 }));
  player.on('volumechange', heard);
  player.on(['timeupdate', 'seeking', 'seeked', 'loadedmetadata'], () => playhead.tick());
  player.on('error', () => {
    if (!player.error()) return;
    const at = playhead.atMs();
    seeks.forget();
    playhead.report({ state: 'broken', frame: 'awaited', fault: faultOf(player.error()?.code, tries) });
    playhead.seekTo(at);
    const { onExpired } = latest();
    clearTimeout(timer);
    timer = setTimeout(retry, retryMs[Math.min(tries, retryMs.length - 1)]);
    onExpired?.();
  });
  window.addEventListener('online', retryOnline);

  playhead.attach({
    currentMs: seeks.currentMs,
    seekTo: seeks.seekTo,
    // a browser may refuse to start with sound before the first touch: it then stays paused
    play: () => void Promise.resolve(player.play()).catch(settled),
    pause: () => player.pause(),
    setRate: (rate) => {
      // a new address would start at the default again
      player.defaultPlaybackRate(rate);
      player.playbackRate(rate);
    },
    setSound: ({ volume, sound }) => {
      if (volume !== undefined) player.volume(volume);
      if (sound !== undefined) player.muted(sound === 'muted');
    },
    video,
  });

  return {
    load,
    end() {
      clearTimeout(timer);
      cancelAnimationFrame(frame);
      window.removeEventListener('online', retryOnline);
      playhead.attach(null);
      seeks.forget();
    },
  };
}

/**
 * Where to seek, in seconds, so that the frame which holds a time is shown: its middle, or the time itself where that is later,
 * so that whoever asks for a chapter's start is never told a time before it. Exact frame times land one frame early.
 */
export function insideFrame(ms: number, fps: number): number {
  const middle = (Math.floor((ms / 1000) * fps + 1e-6) + 0.5) / fps;
  return Math.max(middle, ms / 1000);
}

function seekOneByOne(player: Player, fps: () => number) {
  let wanted: number | null = null;
  let timer: ReturnType<typeof setTimeout> | undefined;
  const seek = (ms: number) => {
    wanted = null;
    clearTimeout(timer);
    const end = player.duration() ?? 0;
    const to = insideFrame(ms, fps());
    player.currentTime(end > 0 ? Math.min(to, Math.max(0, end - 0.001)) : to);
  };
  const goOn = () => {
    if (wanted !== null) seek(wanted);
  };
  player.on('seeked', goOn);
  return {
    currentMs: () => wanted ?? Math.round((player.currentTime() ?? 0) * 1000),
    seekTo(ms: number) {
      if (!player.seeking()) return seek(ms);
      if (wanted === null) timer = setTimeout(goOn, frameWaitMs);
      wanted = ms;
    },
    forget() {
      wanted = null;
      clearTimeout(timer);
    },
  };
}

/** MediaError codes as HTML's media elements have them: 2 network, 3 decoding, 4 no such source. */
function faultOf(code: number | undefined, tries: number): string {
  if (!navigator.onLine) return 'There is no connection. The picture goes on by itself when it is back.';
  if (code === 3) return 'The picture broke off. It is tried again by itself.';
  // the same code for a server that does not answer and for a format that is not known
  if (code === 4 && tries >= 3)
    return 'The picture does not arrive, or this browser cannot show it. It is tried again by itself.';
  return 'The picture does not arrive. It goes on by itself as soon as it can.';
}
