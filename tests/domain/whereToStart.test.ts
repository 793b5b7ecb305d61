import { describe, expect, it } from 'vitest';
import { whereToStart } from '../../src/features/player/whereToStart';

const recording = {
  durationMs: 680_000,
  placeMs: 300_000,
  chapters: [
    { id: 'warm-up', startMs: 62_000 },
    { id: 'step-up', startMs: 253_000 },
  ],
};
const start = (search: string, change: Partial<typeof recording> | { placeMs: null } = {}) =>
  whereToStart(new URLSearchParams(search), { ...recording, ...change });

describe('where a recording starts', () => {
  // W3C Media Fragments URI 1.0, 4.2.1: normal play time in seconds, with "npt:" or without it
  it.each([
    ['t=271.2', 271_200],
    ['t=npt:10', 10_000],
    ['t=4:31', 271_000],
    ['t=0', 0],
  ])('takes a time from the address: %s', (search, atMs) => {
    expect(start(search)).toEqual({ atMs, because: 'time' });
  });

  it('takes a time before a chapter and a chapter before the place where one stopped', () => {
    expect(start('t=10&c=step-up')).toEqual({ atMs: 10_000, because: 'time' });
    expect(start('c=step-up')).toEqual({ atMs: 253_000, because: 'chapter' });
  });

  it('never starts past the end', () => {
    expect(start('t=9999').atMs).toBe(680_000);
  });

  it('carries on where one stopped when the address says nothing that can be followed', () => {
    for (const search of ['', 't=soon', 't=-5', 'c=gone'])
      expect(start(search)).toEqual({ atMs: 300_000, because: 'place' });
  });

  it('starts at the beginning for those who had hardly begun, had seen the end, or were never here', () => {
    for (const placeMs of [4999, 675_001, null])
      expect(start('', { placeMs })).toEqual({ atMs: 0, because: 'beginning' });
  });
});
