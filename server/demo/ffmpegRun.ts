import { type ChildProcess, spawn } from 'node:child_process';
import type { Readable, Writable } from 'node:stream';

/** A running ffmpeg that reads what we made ourselves: no jail is needed, only a way to stop it. */
export type FfmpegRun = { input: Writable; output: Readable; ended: Promise<void> };

/** Starts ffmpeg on `pipe:0` and `pipe:1`. `ended` rejects with its last words, or with the signal's reason when stopped. */
export function runFfmpeg(args: readonly string[], signal?: AbortSignal): FfmpegRun {
  signal?.throwIfAborted();
  const child = spawn('ffmpeg', ['-hide_banner', '-v', 'error', '-y', ...args], { signal, killSignal: 'SIGKILL' });
  const ended = endOf(child, signal);
  // whoever started it may not wait yet when it fails
  ended.catch(() => {});
  // a pipe breaks when ffmpeg has gone, and its exit code tells why
  child.stdin.on('error', () => {});
  return { input: child.stdin, output: child.stdout, ended };
}

function endOf(child: ChildProcess, signal: AbortSignal | undefined): Promise<void> {
  let lastWords = '';
  child.stderr?.on('data', (bytes) => {
    lastWords = (lastWords + bytes).slice(-2000);
  });
  return new Promise((resolve, reject) => {
    child.once('error', (error) => reject(signal?.aborted ? signal.reason : error));
    child.once('close', (code) => {
      if (code === 0) resolve();
      else reject(signal?.aborted ? signal.reason : new Error(`ffmpeg ended with ${code}: ${lastWords.trim()}`));
    });
  });
}
