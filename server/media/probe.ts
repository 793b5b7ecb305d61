import { open } from 'node:fs/promises';
import { faultOfBoxes } from './boxes';
import { faultOfFirstBytes } from './firstBytes';
import { measureLength } from './length';
import { MediaFault } from './mediaFault';
import { policy } from './policy';
import {
  type Description,
  describeRecording,
  lengthOf,
  parseDescription,
  rateOf,
  recordedAt,
  rotationOf,
  type Stream,
  shownSize,
} from './readProbe';
import { runProbe } from './runProbe';

export type ProbedRecording = {
  /** as a player shows it: the longer of picture and sound */
  durationMs: number;
  /** of the picture alone; null where the container doesn't tell (then `durationMs` is all that is known) */
  pictureMs: number | null;
  /** as shown: turned upright, square pixels */
  width: number;
  height: number;
  /** degrees clockwise that the stored picture is turned when shown */
  rotation: 0 | 90 | 180 | 270;
  /** pictures a second on average */
  fps: number;
  /** whether the pictures come at even distances; phones stretch them in the dark */
  evenRate: boolean;
  /** ffprobe's names: `h264`, `hevc`, `aac` … */
  videoCodec: string;
  audioCodec: string | null;
  pixFmt: string;
  interlaced: boolean;
  channels: number | null;
  /** which streams of the file these are, for `-map` */
  videoStream: number;
  audioStream: number | null;
  bytes: number;
  /** ffprobe's name: `mov,mp4,m4a,3gp,3g2,mj2`, `matroska,webm`, `mpegts`, `avi` */
  container: string;
  /** ISO 8601 UTC, where the camera noted it */
  recordedAt: string | null;
};

/**
 * What a recording is, or why it can't be used. Reads the first bytes, then the box lengths, and only then lets ffprobe open it.
 * @param path absolute
 * @throws MediaFault with a sentence for the coach; the signal's reason on abort
 */
export async function probeRecording(path: string, signal?: AbortSignal): Promise<ProbedRecording> {
  const bytes = await examine(path);
  const run = await runProbe(path, describeRecording, signal);
  const description = parseDescription(run.stdout);
  if (run.exit !== 0 || description === undefined) throw unread(run.stderr);
  const { picture, sound } = usedStreams(description);
  if (picture === undefined) throw new MediaFault('noPicture');
  refuseSize(picture, run.stderr);

  const average = rateOf(picture.avg_frame_rate);
  const nominal = rateOf(picture.r_frame_rate);
  if (average !== null && average < policy.minFps) throw new MediaFault('unsupported', `${average} pictures a second`);

  const pictureMs = lengthOf(picture);
  const known = Math.max(pictureMs ?? 0, sound ? (lengthOf(sound) ?? 0) : 0) || headerLength(description);
  if (known !== null && known > policy.longestMs) throw new MediaFault('tooLong', `${known} ms`);

  return {
    durationMs: known ?? (await measureLength(path, signal)),
    pictureMs,
    ...shownSize(picture),
    rotation: rotationOf(picture),
    fps: average ?? (nominal !== null && nominal <= 120 ? nominal : 30),
    evenRate: average !== null && nominal !== null && Math.abs(average - nominal) / nominal < 0.01,
    videoCodec: picture.codec_name ?? 'unknown',
    audioCodec: sound?.codec_name ?? null,
    pixFmt: picture.pix_fmt ?? 'unknown',
    interlaced: !['progressive', 'unknown', undefined].includes(picture.field_order),
    channels: sound?.channels ?? null,
    videoStream: picture.index,
    audioStream: sound?.index ?? null,
    bytes,
    container: description.format.format_name,
    recordedAt: recordedAt(description.format.tags),
  };
}

/** @returns the file's size */
async function examine(path: string): Promise<number> {
  const file = await open(path, 'r');
  try {
    const { size } = await file.stat();
    if (size === 0) throw new MediaFault('empty');
    if (size > policy.largestBytes) throw new MediaFault('tooLarge', `${size} bytes`);
    const firstBytes = await faultOfFirstBytes(file);
    if (firstBytes) throw new MediaFault(firstBytes, 'told by the first bytes');
    const boxes = await faultOfBoxes(file, size);
    if (boxes) throw new MediaFault('truncated', boxes);
    return size;
  } finally {
    await file.close();
  }
}

/** The first moving picture and the first sound that has a reader: phones add cover pictures and sound in formats of their own. */
function usedStreams({ streams }: Description) {
  const known = streams.filter((stream) => stream.codec_name !== undefined && stream.codec_name !== 'unknown');
  return {
    picture: known.find((stream) => stream.codec_type === 'video' && stream.disposition?.attached_pic !== 1),
    sound: known.find((stream) => stream.codec_type === 'audio' && (stream.channels ?? 0) > 0),
  };
}

function refuseSize(picture: Stream, stderr: string) {
  const { width, height } = shownSize(picture);
  // a picture size that the policy refuses, and one that was never sent, both read as zero
  if (width === 0 || height === 0)
    throw new MediaFault(/size|dimensions/i.test(stderr) ? 'tooLarge' : 'truncated', stderr);
  if (width * height > policy.maxPixels) throw new MediaFault('tooLarge', `${width} × ${height}`);
  const short = Math.min(width, height);
  if (short < policy.minSide || Math.max(width, height) / short > policy.maxAspect)
    throw new MediaFault('unsupported', `${width} × ${height}`);
}

function headerLength({ format }: Description): number | null {
  const seconds = Number(format.duration ?? Number.NaN);
  return Number.isFinite(seconds) && seconds > 0 ? Math.round(seconds * 1000) : null;
}

function unread(stderr: string) {
  if (/not on whitelist/i.test(stderr)) return new MediaFault('unsupported', stderr);
  if (/Cannot allocate memory|max_pixels|Picture size/i.test(stderr)) return new MediaFault('tooLarge', stderr);
  return new MediaFault('notVideo', stderr);
}
