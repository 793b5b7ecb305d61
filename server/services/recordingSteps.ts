import { createHash } from 'node:crypto';
import type { MakingStep, StepState } from '../../shared/domain/words';
import { inTransaction } from '../models/database';
import { RecordingStep } from '../models/recordings';
import { tell } from './live';

/** What the worker does with a recording, step by step, as people see it. */

export type OfRecording = { teamId: string; recordingId: string };

/** Pages hear of progress at most this often. */
const progressEveryMs = 500;

/**
 * What a result is made from, as a name: the same original, step and parameters give the same name, so that doing it
 * again writes over the same object.
 */
export function inputOf(step: MakingStep, version: number, ...from: readonly (string | number)[]): string {
  return createHash('sha256')
    .update(JSON.stringify([step, version, ...from]))
    .digest('hex')
    .slice(0, 24);
}

/** A step that was asked for. What it was made from stays known, so that a finished one is not done again. */
export function waitForStep(recording: OfRecording, step: MakingStep): Promise<void> {
  return save(recording, step, { state: 'waiting', percent: 0, startedAt: null, endedAt: null });
}

/** Whether the step's result is there, made from exactly this. */
export async function isDone({ teamId, recordingId }: OfRecording, step: MakingStep, input: string): Promise<boolean> {
  const row = await RecordingStep.findOne({ where: { teamId, recordingId, step } });
  return row?.state !== 'failed' && row?.input === input;
}

export function startStep(recording: OfRecording, step: MakingStep): Promise<void> {
  return save(recording, step, { state: 'running', percent: 0, input: null, startedAt: new Date(), endedAt: null });
}

/** @param input what the result was made from */
export function finishStep(recording: OfRecording, step: MakingStep, input: string): Promise<void> {
  return save(recording, step, { state: 'done', percent: 100, input, endedAt: new Date() });
}

export function failStep(recording: OfRecording, step: MakingStep): Promise<void> {
  return save(recording, step, { state: 'failed', input: null, endedAt: new Date() });
}

/**
 * Takes a step's percent as often as they come and passes on two a second.
 * @returns `settle` waits for the last one, so that none arrives after the step's end
 */
export function progressOf(recording: OfRecording, step: MakingStep) {
  let last = 0;
  let writing: Promise<void> = Promise.resolve();
  return {
    report(percent: number): void {
      const now = Date.now();
      if (now - last < progressEveryMs) return;
      last = now;
      // progress is for the eye: one that is lost breaks nothing
      writing = writing.then(() => save(recording, step, { state: 'running', percent })).catch(() => undefined);
    },
    settle: () => writing,
  };
}

type Values = {
  state: StepState;
  percent?: number;
  input?: string | null;
  startedAt?: Date | null;
  endedAt?: Date | null;
};

async function save({ teamId, recordingId }: OfRecording, step: MakingStep, values: Values): Promise<void> {
  await inTransaction(async () => {
    const [count] = await RecordingStep.update(values, { where: { teamId, recordingId, step } });
    if (count === 0) await RecordingStep.upsert({ teamId, recordingId, step, ...values });
    const { state, percent = 0 } = values;
    await tell(teamId, { type: 'step', recordingId, step, state, percent });
  });
}
