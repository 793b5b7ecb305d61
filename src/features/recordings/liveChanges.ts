import type { LiveEvent } from '../../../shared/contracts/live';
import type { Recording } from '../../../shared/contracts/recordings';

type StepEvent = Extract<LiveEvent, { type: 'step' }>;

/** A recording with what was told of one of its steps. */
export function withStep(recording: Recording, { step, state, percent }: StepEvent): Recording {
  const before = recording.steps.find((one) => one.step === step);
  const told = { step, state, percent };
  const steps = before ? recording.steps.map((one) => (one.step === step ? told : one)) : [...recording.steps, told];
  return { ...recording, steps };
}

/** Whether something is going on with a recording that a page waits for. */
export const isInMotion = ({ state, steps }: Recording): boolean =>
  state === 'uploading' ||
  state === 'making' ||
  steps.some((step) => step.state === 'running' || step.state === 'waiting');
