import type { RecordingScript } from '../script';

/** How each coach sounds and looks. */
export const dario = {
  voice: { name: 'en-gb+m3', wordsPerMinute: 134, pitch: 42 },
  dress: 'green',
} as const satisfies Pick<RecordingScript, 'voice' | 'dress'>;

export const wilma = {
  voice: { name: 'en-gb-scotland+f2', wordsPerMinute: 130, pitch: 52 },
  dress: 'plum',
} as const satisfies Pick<RecordingScript, 'voice' | 'dress'>;
