import { useSyncExternalStore } from 'react';

export type PlayState = 'loading' | 'paused' | 'playing' | 'waiting' | 'ended' | 'broken';

/** What the player shows right now; the time itself is read with `atMs`, which changes too often for this. */
export type PlaySnapshot = {
  state: PlayState;
  durationMs: number;
  rate: number;
  /** 0 to 1 */
  volume: number;
  sound: 'on' | 'muted';
  /** whether the frame of this time is there, or still on its way */
  frame: 'shown' | 'awaited';
  /** what keeps it from playing, in words */
  fault: string | null;
};

/** What a player lets a playhead do. */
export type Media = {
  currentMs(): number;
  seekTo(ms: number): void;
  play(): void;
  pause(): void;
  setRate(rate: number): void;
  setSound(change: { volume?: number; sound?: 'on' | 'muted' }): void;
  video(): HTMLVideoElement | null;
};

const isReady = ({ state }: PlaySnapshot) => state !== 'loading' && state !== 'broken';

/**
 * The hand on a recording: pages hold one and give it to the player, lists and timelines read it and move it.
 * Seeking, playing and the speed are remembered while the picture is not there, and done when it comes.
 */
export class Playhead {
  private media: Media | null = null;
  private wantedMs: number | null = null;
  private wants: 'play' | 'pause' = 'pause';
  private wantedRate = 1;
  private seeks = 0;
  private snapshot: PlaySnapshot = {
    state: 'loading',
    durationMs: 0,
    rate: 1,
    volume: 1,
    sound: 'on',
    frame: 'awaited',
    fault: null,
  };
  private readonly listeners = new Set<() => void>();
  private readonly timeListeners = new Set<() => void>();

  /** the time that plays, ms; while a seek waits for the picture, the time that is sought */
  atMs(): number {
    return this.wantedMs ?? this.media?.currentMs() ?? 0;
  }

  current = (): PlaySnapshot => this.snapshot;

  seekTo(ms: number): void {
    const { durationMs } = this.snapshot;
    const to = Math.max(0, durationMs > 0 ? Math.min(ms, durationMs) : ms);
    if (this.media && isReady(this.snapshot)) this.media.seekTo(to);
    else this.wantedMs = to;
    this.seeks += 1;
    this.tick();
  }

  /** How often it was moved: who watches the time tells by it whether the time ran or somebody went elsewhere. */
  seekCount(): number {
    return this.seeks;
  }

  play(): void {
    this.wants = 'play';
    if (isReady(this.snapshot)) this.media?.play();
  }

  pause(): void {
    this.wants = 'pause';
    this.media?.pause();
  }

  /** Whether it plays, or would if the picture were there. */
  isGoing(): boolean {
    return isReady(this.snapshot)
      ? this.snapshot.state === 'playing' || this.snapshot.state === 'waiting'
      : this.wants === 'play';
  }

  toggle(): void {
    if (this.isGoing()) this.pause();
    else this.play();
  }

  setRate(rate: number): void {
    this.wantedRate = rate;
    if (this.media) this.media.setRate(rate);
    else this.report({ rate });
  }

  /** @param volume 0 to 1 */
  setVolume(volume: number): void {
    this.media?.setSound({ volume: Math.min(1, Math.max(0, volume)), sound: volume > 0 ? 'on' : 'muted' });
  }

  setSound(sound: 'on' | 'muted'): void {
    this.media?.setSound({ sound });
  }

  /** The element that shows the picture, for what only it can do: a window of its own, a phone's full screen. */
  video(): HTMLVideoElement | null {
    return this.media?.video() ?? null;
  }

  subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  subscribeTime = (listener: () => void): (() => void) => {
    this.timeListeners.add(listener);
    return () => this.timeListeners.delete(listener);
  };

  /** For the player alone: it can be moved from now on. A player that goes leaves the place where it was. */
  attach(media: Media | null): void {
    if (!media && this.media && isReady(this.snapshot)) this.wantedMs = this.media.currentMs();
    this.media = media;
    if (media) media.setRate(this.wantedRate);
    else this.report({ state: 'loading', frame: 'awaited' });
  }

  /** For the player alone: what changed. */
  report(change: Partial<PlaySnapshot>): void {
    const was = this.snapshot;
    const next = { ...was, ...change };
    if ((Object.keys(next) as (keyof PlaySnapshot)[]).every((name) => next[name] === was[name])) return;
    this.snapshot = next;
    if (isReady(was) && !isReady(next))
      this.wants = was.state === 'playing' || was.state === 'waiting' ? 'play' : 'pause';
    if (!isReady(was) && isReady(next)) this.catchUp();
    for (const listener of this.listeners) listener();
  }

  /** For the player alone: the time moved. */
  tick(): void {
    for (const listener of this.timeListeners) listener();
  }

  private catchUp(): void {
    const to = this.wantedMs;
    this.wantedMs = null;
    if (to !== null) this.media?.seekTo(to);
    if (this.wants === 'play') this.media?.play();
  }
}

export function usePlayState(playhead: Playhead): PlaySnapshot {
  return useSyncExternalStore(playhead.subscribe, playhead.current);
}

/** The time that plays, rounded down to steps, so that a component is drawn again no more often than it needs. */
export function useAtMs(playhead: Playhead, stepMs: number): number {
  return useSyncExternalStore(playhead.subscribeTime, () => Math.floor(playhead.atMs() / stepMs) * stepMs);
}

/** A value that depends on the time, drawn again only when it changes: the chapter that plays, the line that is said. */
export function useAtPlayhead<T extends string | number | null | undefined>(
  playhead: Playhead,
  read: (ms: number) => T,
): T {
  return useSyncExternalStore(playhead.subscribeTime, () => read(playhead.atMs()));
}
