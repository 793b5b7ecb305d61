import type { ProbedRecording } from '../probe';

/** What becomes of the sound: taken as it is, made into what every browser plays, or there is none. */
export type SoundPlan = 'copied' | 'made' | 'none';

export function soundPlan({ audioStream, audioCodec, channels }: ProbedRecording): SoundPlan {
  if (audioStream === null) return 'none';
  return audioCodec === 'aac' && (channels ?? 0) <= 2 ? 'copied' : 'made';
}

/**
 * AAC in stereo: mono plays on both sides, 5.1 is mixed down. `aresample` fills gaps in the sound with silence and keeps it
 * in step where a phone's clock drifts.
 */
export const makeSound = ['-c:a', 'aac', '-b:a', '128k', '-ac', '2', '-ar', '48000', '-af', 'aresample=async=1'];
