import { describe, expect, it } from 'vitest';
import { type Media, Playhead } from '../../src/lib/playhead';

/** What a player does with a playhead, without a picture. */
function attached(playhead: Playhead) {
  const did: string[] = [];
  const at = { ms: 0 };
  const media: Media = {
    currentMs: () => at.ms,
    seekTo: (ms) => {
      at.ms = ms;
      did.push(`seek ${ms}`);
    },
    play: () => did.push('play'),
    pause: () => did.push('pause'),
    setRate: (rate) => did.push(`rate ${rate}`),
    setSound: () => undefined,
    video: () => null,
  };
  playhead.attach(media);
  return { did, at };
}

describe('a playhead', () => {
  it('remembers where to go, at what speed, and to play, until the picture is there', () => {
    const playhead = new Playhead();
    playhead.seekTo(271_200);
    playhead.setRate(0.5);
    playhead.play();
    expect(playhead.atMs()).toBe(271_200);
    const { did } = attached(playhead);
    expect(did).toEqual(['rate 0.5']);
    playhead.report({ state: 'paused', durationMs: 680_000 });
    expect(did).toEqual(['rate 0.5', 'seek 271200', 'play']);
  });

  it('does not start by itself when it was paused while it waited', () => {
    const playhead = new Playhead();
    playhead.play();
    playhead.pause();
    const { did } = attached(playhead);
    playhead.report({ state: 'paused' });
    expect(did).not.toContain('play');
  });

  it('goes on at its place, playing, after the picture broke', () => {
    const playhead = new Playhead();
    const { did, at } = attached(playhead);
    playhead.report({ state: 'playing', durationMs: 60_000 });
    at.ms = 12_000;
    playhead.report({ state: 'broken', fault: 'no connection' });
    playhead.seekTo(12_000);
    at.ms = 0;
    expect(playhead.atMs()).toBe(12_000);
    expect(playhead.isGoing()).toBe(true);
    playhead.report({ state: 'paused', fault: null });
    expect(did.slice(-2)).toEqual(['seek 12000', 'play']);
  });

  it('keeps its place when one player leaves and another comes', () => {
    const playhead = new Playhead();
    const first = attached(playhead);
    playhead.report({ state: 'paused', durationMs: 60_000 });
    first.at.ms = 30_000;
    playhead.attach(null);
    expect(playhead.atMs()).toBe(30_000);
    const second = attached(playhead);
    playhead.report({ state: 'paused' });
    expect(second.did).toContain('seek 30000');
  });

  it('never goes before the beginning or past the end', () => {
    const playhead = new Playhead();
    const { did } = attached(playhead);
    playhead.report({ state: 'paused', durationMs: 60_000 });
    playhead.seekTo(-4000);
    playhead.seekTo(64_000);
    expect(did.slice(-2)).toEqual(['seek 0', 'seek 60000']);
  });

  it('tells its listeners only of what changed', () => {
    const playhead = new Playhead();
    let told = 0;
    playhead.subscribe(() => {
      told += 1;
    });
    playhead.report({ state: 'paused' });
    playhead.report({ state: 'paused' });
    expect(told).toBe(1);
  });
});
