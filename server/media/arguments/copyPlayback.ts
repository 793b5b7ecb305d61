import type { ProbedRecording } from '../probe';
import { playbackFile } from './playbackFile';
import { makeSound, soundPlan } from './sound';

/** Containers whose timestamps can be taken over as they are; transport streams restart their clocks, AVI has none. */
const copiedContainers = /^(mov,mp4|matroska)/;

/** A 1080p picture and a rate that phones film with and a home connection carries; above this a smaller playback is made. */
const copied = { longSide: 1920, shortSide: 1088, bitsPerSecond: 20_000_000, fps: 60.5 };

/**
 * The longest stretch without a key frame that is still copied: 10 s, which is what encoders use when nobody says
 * otherwise (250 pictures at 25 a second). A seek lands on the exact picture either way, as a player decodes from the key frame
 * before it; sparse ones only make it slower (median 0.5 s instead of 0.25 s from tap to picture, measured with 8 s). Beyond that a tap
 * feels broken, so a playback with a key frame every 2 s is made.
 */
export const sparsestCopiedMs = 10_000;

/** Whether the picture plays in every browser as it is: H.264 in 8 bits and 4:2:0, progressive, not oversized. */
export function canCopyPicture(probed: ProbedRecording): boolean {
  return (
    copiedContainers.test(probed.container) &&
    probed.videoCodec === 'h264' &&
    (probed.pixFmt === 'yuv420p' || probed.pixFmt === 'yuvj420p') &&
    !probed.interlaced &&
    probed.fps <= copied.fps &&
    Math.max(probed.width, probed.height) <= copied.longSide &&
    Math.min(probed.width, probed.height) <= copied.shortSide &&
    (probed.bytes * 8 * 1000) / probed.durationMs <= copied.bitsPerSecond
  );
}

/** The picture taken over as it is, with its turning; the sound too where it is AAC, else made. */
export function copyPlayback(probed: ProbedRecording): string[] {
  const sound = soundPlan(probed);
  return [
    '-map',
    `0:${probed.videoStream}`,
    '-c:v',
    'copy',
    ...(sound === 'none' ? [] : ['-map', `0:${probed.audioStream}`]),
    ...(sound === 'copied' ? ['-c:a', 'copy'] : sound === 'made' ? makeSound : []),
    ...playbackFile,
  ];
}
