import type { ProbedRecording } from '../probe';
import { fitWithin } from './frameSize';

/** px; three in a row on a phone, one beside a line of text on a desk, sharp on dense screens */
export const thumbnailWidth = 320;
/** a portrait picture's thumbnail is not taller than two of its widths */
const thumbnailHeight = 640;
const posterBox = { long: 1280, short: 720 };

/** How far a run looks for a picture that shows something, in s; a fade from black is shorter. */
const searchSeconds = 3;
/** Of so many neighbours the most usual one is taken, not the one in the middle of a cut. */
const neighbours = 12;

/** Less than 85 % of the picture is near black (luma under 32 of 255): a dim room passes, a lens cap doesn't. */
const notBlack =
  'blackframe=amount=0:threshold=32,metadata=mode=select:key=lavfi.blackframe.pblack:value=85:function=less';

/** `best` looks for a picture near the time that shows something; `any` takes the one that is there. */
export type Choice = 'best' | 'any';

/** Before `-i`: the seek is by key frame and then exact, so it costs the same anywhere in a recording. */
export const seekTo = (atMs: number) => ['-threads', '1', '-ss', (atMs / 1000).toFixed(3), '-t', String(searchSeconds)];

/** Before `-i`: the last second, for a time past the end. */
export const seekToEnd = ['-threads', '1', '-sseof', '-1'];

export function posterOutput(probed: ProbedRecording, choice: Choice): string[] {
  const { width, height } = fitWithin(probed, posterBox);
  return picture(`0:${probed.videoStream}`, `scale=${width}:${height},setsar=1`, choice, 3);
}

/** @param input which of the run's inputs */
export const thumbnailOutput = (input: number, choice: Choice) =>
  picture(
    // capital V: a moving picture, no cover
    `${input}:V:0`,
    `scale=iw*sar:ih,setsar=1,scale=${thumbnailWidth}:${thumbnailHeight}:force_original_aspect_ratio=decrease:force_divisible_by=2`,
    choice,
    4,
  );

/** One JPEG: browsers, mail programs and link previews all show it. @param quality 2 (best) to 31 */
const picture = (stream: string, scaling: string, choice: Choice, quality: number) => [
  '-map',
  stream,
  '-vf',
  [
    scaling,
    ...(choice === 'best' ? ['format=yuv420p', notBlack, `thumbnail=n=${neighbours}`] : []),
    'format=yuvj420p',
  ].join(','),
  '-frames:v',
  '1',
  '-map_metadata',
  '-1',
  '-c:v',
  'mjpeg',
  '-threads',
  '1',
  '-q:v',
  String(quality),
  // one file under exactly this name: a percent sign in it is no pattern
  '-f',
  'image2',
  '-update',
  '1',
];
