import { useSyncExternalStore } from 'react';

export type PlayState = 'loading' | 'paused' | 'playing' | 'waiting' | 'ended' | 'broken';

/** What the player shows right now; the time itself is read with `atMs`, which changes too often for this. */
export type PlaySnapshot = {
  state: PlayState;
  durationMs: number;
  rate: number;
  /** what kept it from playing, in words */
  fault: string | null;
};

type Media = {
  currentMs(): number;
  seekTo(ms: number): void;
  play(): void;
  pause(): void;
  setRate(rate: number): void;
};

/**
 * The hand on a recording: pages hold one and give it to the player, lists and timelines read it and move it.
 * Seeking before the picture is there is remembered and done then.
 */
export class Playhead {
  private media: Media | null = null;
  private wantedMs: number | null = null;
  private snapshot: PlaySnapshot = { state: 'loading', durationMs: 0, rate: 1, fault: null };
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
    if (this.media && this.snapshot.state !== 'loading') this.media.seekTo(to);
    else this.wantedMs = to;
    this.tick();
  }

  play(): void {
    this.media?.play();
  }

  pause(): void {
    this.media?.pause();
  }

  toggle(): void {
    if (this.snapshot.state === 'playing' || this.snapshot.state === 'waiting') this.pause();
    else this.play();
  }

  setRate(rate: number): void {
    this.media?.setRate(rate);
  }

  subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  subscribeTime = (listener: () => void): (() => void) => {
    this.timeListeners.add(listener);
    return () => this.timeListeners.delete(listener);
  };

  /** For the player alone: it can be moved from now on. */
  attach(media: Media | null): void {
    this.media = media;
    if (!media) this.report({ state: 'loading' });
  }

  /** For the player alone: what changed. */
  report(change: Partial<PlaySnapshot>): void {
    const was = this.snapshot;
    this.snapshot = { ...was, ...change };
    if (was.state === 'loading' && this.snapshot.state !== 'loading' && this.wantedMs !== null) {
      const to = this.wantedMs;
      this.wantedMs = null;
      this.media?.seekTo(to);
    }
    for (const listener of this.listeners) listener();
  }

  /** For the player alone: the time moved. */
  tick(): void {
    for (const listener of this.timeListeners) listener();
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
