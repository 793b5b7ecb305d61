import { describe, expect, it } from 'vitest';
import type { Recording } from '../../shared/contracts/recordings';
import { isInMotion, withStep } from '../../src/features/recordings/liveChanges';
import { makingOf, notMadeOf } from '../../src/features/recordings/makingWords';

const recordingId = 'f9a1c3f4-6f0b-4f39-8d62-2f4c63a52f10';

const recording = (values: Partial<Recording>): Recording => ({
  id: recordingId,
  title: 'Rows',
  take: 1,
  session: null,
  coach: null,
  fileName: 'rows.mov',
  sizeBytes: 1000,
  state: 'making',
  steps: [],
  failure: null,
  durationMs: null,
  width: null,
  height: null,
  fps: null,
  posterUrl: null,
  chapterCount: 0,
  captionLineCount: 0,
  createdAt: '2026-03-03T06:00:00.000Z',
  version: 0,
  ...values,
});

const step = (values: {
  step: 'probe' | 'poster' | 'playback';
  state: 'waiting' | 'running' | 'done' | 'failed';
  percent?: number;
}) => ({
  percent: 0,
  ...values,
});

describe('what is told of a recording while it is made', () => {
  it('names what takes longest, with its share, and what else goes on', () => {
    const steps = [
      step({ step: 'probe', state: 'done', percent: 100 }),
      step({ step: 'poster', state: 'running' }),
      step({ step: 'playback', state: 'running', percent: 42 }),
    ];
    expect(makingOf(recording({ steps }))).toEqual({
      label: 'Making the web version',
      share: 0.42,
      note: 'also taking a still',
    });
  });

  it('says that it waits before the worker has begun', () => {
    const steps = [step({ step: 'probe', state: 'waiting' })];
    expect(makingOf(recording({ steps }))?.label).toBe('Waits for its turn');
  });

  it('says nothing of a recording that simply plays, and what is missing from one that lacks its still', () => {
    const done = [step({ step: 'playback', state: 'done' })];
    expect(makingOf(recording({ state: 'ready', steps: done }))).toBeNull();
    expect(notMadeOf(recording({ state: 'ready', steps: done }))).toBeNull();
    const broken = [...done, step({ step: 'poster', state: 'failed' })];
    expect(notMadeOf(recording({ state: 'ready', steps: broken }))).toBe('It plays, but the still could not be made.');
  });
});

describe('a step that was told of', () => {
  const told = { type: 'step', recordingId, step: 'playback', state: 'running', percent: 30 } as const;

  it('takes the place of what was known of it, and leaves the others', () => {
    const before = recording({
      steps: [step({ step: 'probe', state: 'done' }), step({ step: 'playback', state: 'waiting' })],
    });
    const after = withStep(before, told);
    expect(after.steps).toEqual([before.steps[0], step({ step: 'playback', state: 'running', percent: 30 })]);
    expect(before.steps[1]?.state).toBe('waiting');
  });

  it('is added where it was not known, and keeps the recording in motion', () => {
    const after = withStep(recording({ state: 'ready' }), told);
    expect(after.steps).toHaveLength(1);
    expect(isInMotion(after)).toBe(true);
    expect(isInMotion(recording({ state: 'ready' }))).toBe(false);
  });
});
