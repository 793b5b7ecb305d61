import { join } from 'node:path';
import { type Choice, posterOutput, seekTo, seekToEnd, thumbnailOutput } from './arguments/pictures';
import { MediaFault } from './mediaFault';
import { pictureLimits, policy } from './policy';
import type { ProbedRecording } from './probe';
import { runFfmpeg } from './runFfmpeg';

/** Each has a reader and a decoder of its own in the run: six of a 4K recording would pass its memory. */
const thumbnailsPerRun = 4;

/** Where in a recording its poster is looked for: past the hand on the lens, before the talk is over. */
const posterAt = (durationMs: number) => Math.min(durationMs * 0.1, 10_000);

export type PosterRequest = {
  /** absolute path of the recording or its playback */
  input: string;
  /** absolute path of the JPEG, at most 1280 × 720 (portrait 720 × 1280) */
  output: string;
  /** of the input */
  probed: ProbedRecording;
  signal?: AbortSignal;
};

/** One picture that stands for the recording; a black one only if there is no other near. */
export async function makePoster({ input, output, probed, signal }: PosterRequest): Promise<void> {
  const tries: [string[], Choice][] = [
    [seekTo(posterAt(probed.durationMs)), 'best'],
    [seekTo(0), 'best'],
    [seekTo(0), 'any'],
  ];
  for (const [seek, choice] of tries) {
    const written = await runFfmpeg({
      inputs: [{ path: input, options: seek }],
      outputs: [{ path: output, options: posterOutput(probed, choice) }],
      limits: pictureLimits,
      deadlineMs: policy.pictureDeadlineMs,
      signal,
    });
    if (written.length > 0) return;
  }
  throw new MediaFault('truncated', 'no picture could be decoded');
}

export type ThumbnailRequest = {
  /** absolute path; the playback costs less to read than what was uploaded */
  input: string;
  /** `id` becomes the file's name */
  times: readonly { id: string; atMs: number }[];
  /** an existing folder */
  folder: string;
  signal?: AbortSignal;
};

export type Thumbnail = { id: string; path: string };

/**
 * A JPEG of 320 px width at each time, `<folder>/<id>.jpg`: the first picture from there on that shows something. A time past the end
 * gives the last picture.
 * @throws MediaFault `truncated` when a time has no picture at all
 */
export async function makeThumbnails({ input, times, folder, signal }: ThumbnailRequest): Promise<Thumbnail[]> {
  const wanted = times.map(({ id, atMs }) => {
    if (!/^[\w-]+$/.test(id)) throw new Error(`“${id}” is no name for a thumbnail`);
    return { id, path: join(folder, `${id}.jpg`), seek: seekTo(atMs) };
  });
  const missing = async (rest: Wanted[], choice: Choice) => {
    const left: Wanted[] = [];
    for (let i = 0; i < rest.length; i += thumbnailsPerRun)
      left.push(...(await run(input, rest.slice(i, i + thumbnailsPerRun), choice, signal)));
    return left;
  };
  const dark = await missing(wanted, 'best');
  const pastEnd = await missing(dark, 'any');
  const never = await missing(
    pastEnd.map((thumbnail) => ({ ...thumbnail, seek: seekToEnd })),
    'any',
  );
  if (never.length > 0) throw new MediaFault('truncated', `no picture for ${never.map(({ id }) => id).join(', ')}`);
  return wanted.map(({ id, path }) => ({ id, path }));
}

type Wanted = Thumbnail & { seek: string[] };

/** One by one where the pictures are too large to be read together. @returns those for which no picture came out */
async function run(input: string, wanted: Wanted[], choice: Choice, signal?: AbortSignal): Promise<Wanted[]> {
  if (wanted.length === 0) return [];
  try {
    return await runTogether(input, wanted, choice, signal);
  } catch (error) {
    if (!(error instanceof MediaFault && error.code === 'tooLarge') || wanted.length === 1) throw error;
    const left: Wanted[] = [];
    for (const one of wanted) left.push(...(await runTogether(input, [one], choice, signal)));
    return left;
  }
}

async function runTogether(input: string, wanted: Wanted[], choice: Choice, signal?: AbortSignal): Promise<Wanted[]> {
  const written = await runFfmpeg({
    inputs: wanted.map(({ seek }) => ({ path: input, options: seek })),
    outputs: wanted.map(({ path }, i) => ({ path, options: thumbnailOutput(i, choice) })),
    limits: pictureLimits,
    deadlineMs: policy.pictureDeadlineMs,
    signal,
  });
  return wanted.filter(({ path }) => !written.includes(path));
}
