import { execFile } from 'node:child_process';
import type { Voice } from './script';

/** What a sentence sounds like: 16-bit mono samples without silence at either end. */
export type Spoken = { samples: Int16Array; durationMs: number };

/** espeak-ng speaks at this rate, in samples a second. */
export const speechRate = 22_050;

/** Below this a sample counts as silence; espeak-ng adds about 0.37 s of it. */
const quiet = 200;

const known = new Map<string, Promise<Spoken>>();

/** Speaks a sentence; the same words in the same voice are spoken once a process. */
export function speak(text: string, voice: Voice): Promise<Spoken> {
  const key = JSON.stringify([voice, text]);
  const before = known.get(key);
  if (before) return before;
  const spoken = synthesise(text, voice);
  known.set(key, spoken);
  spoken.catch(() => known.delete(key));
  return spoken;
}

async function synthesise(text: string, voice: Voice): Promise<Spoken> {
  const wave = await new Promise<Buffer>((resolve, reject) => {
    const args = ['-v', voice.name, '-s', String(voice.wordsPerMinute), '-p', String(voice.pitch), '--stdout', text];
    const options = { encoding: 'buffer', maxBuffer: 64 * 1024 * 1024 } as const;
    execFile('espeak-ng', args, options, (error, stdout) => (error ? reject(error) : resolve(stdout)));
  });
  const samples = trimmed(samplesOf(wave));
  if (samples.length === 0) throw new Error(`Nothing was spoken for “${text}”.`);
  return { samples, durationMs: (samples.length / speechRate) * 1000 };
}

/** The samples of a RIFF file; written to a pipe, its lengths are not filled in, so the data run to the end. */
function samplesOf(wave: Buffer): Int16Array {
  const rate = wave.readUInt32LE(24);
  if (rate !== speechRate) throw new Error(`Speech came at ${rate} samples a second, not at ${speechRate}.`);
  const start = wave.indexOf('data', 36) + 8;
  const samples = new Int16Array((wave.length - start) >> 1);
  for (let i = 0; i < samples.length; i++) samples[i] = wave.readInt16LE(start + i * 2);
  return samples;
}

function trimmed(samples: Int16Array): Int16Array {
  const first = samples.findIndex((sample) => Math.abs(sample) >= quiet);
  if (first < 0) return samples.subarray(0, 0);
  return samples.subarray(first, samples.findLastIndex((sample) => Math.abs(sample) >= quiet) + 1);
}
