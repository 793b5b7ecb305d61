import { randomUUID } from 'node:crypto';
import { rename, rm, stat } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import ffmpeg from 'fluent-ffmpeg';
import { jailPath, limitsArgument } from './jail';
import { MediaFault } from './mediaFault';
import { inputAddress, inputSafety, policy, type RunLimits } from './policy';
import { percentDone, type Whole } from './progress';

/** Enough to see what ffmpeg said last. */
const tailLines = 30;

export type FfmpegRun = {
  /** absolute paths, each with what stands before its `-i` besides the policy */
  inputs: readonly { path: string; options: readonly string[] }[];
  /** absolute paths of what is made, each with its own options; existing files are replaced when the run has succeeded */
  outputs: readonly { path: string; options: readonly string[] }[];
  limits: RunLimits;
  deadlineMs: number;
  signal?: AbortSignal;
  progress?: { whole: Whole; onProgress: (percent: number) => void };
  /** looks at what came out, under its temporary name, before it is published; throws to refuse it */
  check?: (temporary: readonly string[]) => Promise<void>;
};

/**
 * One run of ffmpeg in the jail. What it makes gets its name only when the run has ended well and `check` has not refused it,
 * as a killed ffmpeg leaves a valid, shorter file.
 * @returns the outputs that hold something, under their final paths; a seek past the end leaves an output out
 * @throws MediaFault; or the signal's reason on abort, after the process has gone
 */
export async function runFfmpeg(run: FfmpegRun): Promise<string[]> {
  run.signal?.throwIfAborted();
  const outputs = run.outputs.map((output) => ({ ...output, temporary: temporaryName(output.path) }));
  try {
    await spawnFfmpeg(run, outputs);
    const written = [];
    for (const output of outputs) if (await holdsSomething(output.temporary)) written.push(output);
    await run.check?.(written.map((output) => output.temporary));
    run.signal?.throwIfAborted();
    for (const output of written) await rename(output.temporary, output.path);
    return written.map((output) => output.path);
  } finally {
    await Promise.all(outputs.map((output) => rm(output.temporary, { force: true })));
  }
}

type TemporaryOutput = { temporary: string; options: readonly string[] };

function spawnFfmpeg(run: FfmpegRun, outputs: readonly TemporaryOutput[]): Promise<void> {
  const { signal, progress } = run;
  return new Promise((resolve, reject) => {
    const command = ffmpeg({ stdoutLines: 0 }).setFfmpegPath(jailPath());
    // Options go in as single arguments: in an array fluent-ffmpeg would split them at spaces.
    for (const [i, input] of run.inputs.entries()) {
      const first =
        i === 0
          ? [limitsArgument(run.limits), '-hide_banner', '-nostdin', '-v', 'warning', '-stats', ...fewThreads]
          : [];
      command.input(inputAddress(input.path)).inputOptions(...first, ...inputSafety, ...input.options);
    }
    for (const output of outputs) command.output(output.temporary).outputOptions(...output.options);

    const tail: string[] = [];
    let stoppedFor: 'abort' | 'deadline' | undefined;
    const stop = (reason: 'abort' | 'deadline') => {
      stoppedFor ??= reason;
      command.kill('SIGKILL');
    };
    const onAbort = () => stop('abort');
    const deadline = setTimeout(() => stop('deadline'), run.deadlineMs);
    signal?.addEventListener('abort', onAbort, { once: true });
    const settle = (then: () => void) => {
      clearTimeout(deadline);
      signal?.removeEventListener('abort', onAbort);
      then();
    };

    let percent = 0;
    command
      // the runner first asks ffmpeg for its encoders; an abort in that moment finds nothing to kill
      .on('start', () => stoppedFor && command.kill('SIGKILL'))
      .on('stderr', (line: string) => {
        tail.push(line);
        if (tail.length > tailLines) tail.shift();
        const now = progress && percentDone(line, progress.whole);
        if (now === undefined || now <= percent) return;
        percent = now;
        progress?.onProgress(percent);
      })
      .on('end', () => settle(resolve))
      .on('error', (error: Error) =>
        settle(() => {
          if (stoppedFor === 'abort') reject(signal?.reason);
          else if (stoppedFor === 'deadline')
            reject(new MediaFault('tookTooLong', `stopped after ${run.deadlineMs} ms`));
          else reject(faultOf(error.message, tail.join('\n')));
        }),
      )
      .run();
  });
}

/** What a failed run means for the recording. Exported for its test alone. */
export function faultOf(ended: string, tail: string): Error {
  const detail = `${ended}\n${tail}`;
  if (/exited with code 12[67]\b/.test(ended)) return new Error(`ffmpeg cannot be started: ${detail}`);
  if (/killed with signal SIGXCPU/.test(ended)) return new MediaFault('tookTooLong', detail);
  if (/killed with signal SIGXFSZ/.test(ended) || /File too large/.test(tail))
    return new MediaFault('tooLarge', detail);
  if (/killed with signal/.test(ended) || /No space left on device/.test(tail))
    return new MediaFault('lostWorker', detail);
  if (/moov atom not found|partial file/i.test(tail)) return new MediaFault('truncated', detail);
  return new MediaFault('unsupported', detail);
}

/** Beside its final place, so that the rename is one step; ends alike, so that ffmpeg knows the kind. */
const temporaryName = (path: string) => join(dirname(path), `.making-${randomUUID()}-${basename(path)}`);

async function holdsSomething(path: string) {
  const file = await stat(path).catch(() => undefined);
  return file !== undefined && file.size > 0;
}

/** One thread a processor would be counted as address space by the dozen on a large machine. */
const fewThreads = ['-filter_threads', String(policy.threads)];

/** What stands before the `-i` of a recording that is read as a whole. */
export const wholeRecording = ['-threads', String(policy.threads), '-t', String(policy.longestMs / 1000)];
