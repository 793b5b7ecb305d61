import { createHash } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { MakingStep } from '../../../shared/domain/words';
import { MediaFault } from '../../media/mediaFault';
import type { RecordingFailure } from '../../models/recordings';
import { store } from '../../services/context';
import { giveUp } from '../../services/recordingMaking';
import type { OfRecording } from '../../services/recordingSteps';
import type { JobContext } from '../handler';

export { inPrivateFolder } from '../privateFolder';

/** What all steps of making have in common: the file to work on, and what a fault means. */

/**
 * Fetches an object as a file.
 * @returns the SHA-256 of all its bytes, in hexadecimal
 */
export async function fetchObject(key: string, path: string, signal: AbortSignal): Promise<string> {
  const hash = createHash('sha256');
  const hashing = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      hash.update(chunk);
      done(null, chunk);
    },
  });
  await pipeline(await store().read(key, signal), hashing, createWriteStream(path, { flags: 'wx' }), { signal });
  return hash.digest('hex');
}

/**
 * Runs a step. A fault of the file ends the recording with its sentence; anything else, and a worker that stops, is
 * thrown on, so that the queue tries again.
 */
export async function orGiveUp(
  of: OfRecording,
  step: MakingStep,
  { signal, log }: JobContext,
  work: () => Promise<void>,
): Promise<void> {
  try {
    await work();
  } catch (error) {
    // whatever broke while the worker was told to stop says nothing about the file
    if (signal.aborted || !(error instanceof MediaFault) || isWorthAnotherTry(error)) throw error;
    log.info({ ...of, step, code: error.code, detail: error.detail.slice(0, 2000) }, 'recording refused');
    await giveUp(of, step, failureOf(error));
  }
}

/** A run that took too long takes as long again: whether to try is for people to say. */
const isWorthAnotherTry = (fault: MediaFault) => fault.retry && fault.code !== 'tookTooLong';

/** What is left to say when the queue has tried often enough. */
export const givenUpAt =
  (step: MakingStep) =>
  (of: OfRecording, error: unknown): Promise<void> =>
    giveUp(of, step, failureOf(error));

function failureOf(error: unknown): RecordingFailure {
  if (error instanceof MediaFault) return { code: error.code, message: error.message, retry: error.retry };
  return {
    code: 'broken',
    message: 'Something broke on our side while this recording was prepared. Nothing is lost; try again.',
    retry: true,
  };
}
