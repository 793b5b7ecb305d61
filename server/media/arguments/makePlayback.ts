import { policy } from '../policy';
import type { ProbedRecording } from '../probe';
import { playbackRate } from './frameRate';
import { type FrameSize, fitWithin } from './frameSize';
import { playbackFile } from './playbackFile';
import { makeSound, soundPlan } from './sound';

/** 720p: the largest that any phone decodes without effort; a portrait picture is 720 wide. */
const box = { long: 1280, short: 720 };

/** Seconds between key frames: a tap lands in a quarter of a second; each 1 s costs 9 % more bytes for little (measured). */
const keyFrameSeconds = 2;

export const playbackSize = (probed: FrameSize) => fitWithin(probed, box);

/** How many pictures the playback will have, for telling how far it is. */
export const playbackFrames = (probed: ProbedRecording) =>
  Math.max(1, Math.round((playbackRate(probed).fps * (probed.pictureMs ?? probed.durationMs)) / 1000));

/** H.264 and AAC that every browser plays, turned upright, square pixels, constant rate. */
export function makePlayback(probed: ProbedRecording): string[] {
  const { width, height } = playbackSize(probed);
  return [
    '-map',
    `0:${probed.videoStream}`,
    '-vf',
    [
      ...(probed.interlaced ? ['bwdif=deint=interlaced'] : []),
      `fps=${playbackRate(probed).written}`,
      `scale=${width}:${height}`,
      'setsar=1',
      'format=yuv420p',
    ].join(','),
    '-c:v',
    'libx264',
    '-preset',
    'veryfast',
    '-crf',
    '23',
    '-force_key_frames',
    `expr:gte(t,n_forced*${keyFrameSeconds})`,
    '-sc_threshold',
    '0',
    '-threads',
    String(policy.threads),
    ...(soundPlan(probed) === 'none' ? [] : ['-map', `0:${probed.audioStream}`, ...makeSound]),
    ...playbackFile,
  ];
}
