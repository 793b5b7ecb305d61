import { canCopyPicture, copyPlayback, sparsestCopiedMs } from './arguments/copyPlayback';
import { makePlayback as playbackArguments, playbackFrames } from './arguments/makePlayback';
import { longestKeyFrameGapMs } from './keyFrames';
import { MediaFault } from './mediaFault';
import { makingDeadlineMs, makingLimits } from './policy';
import { type ProbedRecording, probeRecording } from './probe';
import type { Whole } from './progress';
import { runFfmpeg, wholeRecording } from './runFfmpeg';

export type PlaybackRequest = {
  /** absolute path of what was uploaded */
  input: string;
  /** absolute path of the MP4 to make */
  output: string;
  probed: ProbedRecording;
  signal?: AbortSignal;
  /** whole percent, 1 to 99, only ever upwards */
  onProgress?: (percent: number) => void;
};

export type Playback = {
  /** whether the picture was taken over as it is */
  how: 'copied' | 'made';
  bytes: number;
  /** as shown */
  width: number;
  height: number;
  durationMs: number;
};

/** What a playback may lack of the announced length: a last picture's own time, or what a clock of thousandths rounds away. */
const toleratedLossMs = (durationMs: number) => Math.max(1000, durationMs * 0.002);

/**
 * The file that browsers play: copied within seconds where the codecs allow, else made.
 * Running it again gives the same file under the same name.
 * @throws MediaFault `truncated` when less came out than the recording announces (a file cut off in the middle converts
 *   without an error), `tookTooLong`, `unsupported` …; the signal's reason on abort
 */
export async function makePlayback(request: PlaybackRequest): Promise<Playback> {
  const { input, probed, signal } = request;
  const copies =
    canCopyPicture(probed) && (await longestKeyFrameGapMs(input, probed.videoStream, signal)) <= sparsestCopiedMs;
  return copies
    ? produce(request, 'copied', copyPlayback(probed), { durationMs: probed.durationMs })
    : produce(request, 'made', playbackArguments(probed), { frames: playbackFrames(probed) });
}

async function produce(
  request: PlaybackRequest,
  how: Playback['how'],
  options: string[],
  whole: Whole,
): Promise<Playback> {
  const { input, output, probed, signal, onProgress } = request;
  let made: ProbedRecording | undefined;
  await runFfmpeg({
    inputs: [{ path: input, options: wholeRecording }],
    outputs: [{ path: output, options }],
    limits: makingLimits(probed.durationMs),
    deadlineMs: makingDeadlineMs(probed.durationMs),
    signal,
    progress: onProgress && { whole, onProgress },
    check: async ([file]) => {
      if (file === undefined) throw new MediaFault('truncated', 'nothing came out');
      made = await probeRecording(file, signal);
      refuseShorter(probed, made);
    },
  });
  if (made === undefined) throw new Error('ffmpeg ended well, but nothing was checked');
  return { how, bytes: made.bytes, width: made.width, height: made.height, durationMs: made.durationMs };
}

function refuseShorter(announced: ProbedRecording, made: ProbedRecording) {
  const expected = announced.pictureMs ?? announced.durationMs;
  const came = announced.pictureMs === null ? made.durationMs : (made.pictureMs ?? made.durationMs);
  if (came < expected - toleratedLossMs(expected))
    throw new MediaFault('truncated', `${came} of ${expected} ms came out`);
}
