import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { rename, rm, writeFile } from 'node:fs/promises';
import type { Writable } from 'node:stream';
import { dresses } from './drawing/dresses';
import { drawLoop, pictureMs, picturesPerSecond } from './drawing/frames';
import { picture } from './drawing/place';
import { type Layout, layOutScript, type Timing } from './layOutScript';
import type { RecordingScript } from './script';
import { speechRate } from './speech';

type Options = {
  signal?: AbortSignal;
  /** whole per cent, rising */
  onProgress?: (percent: number) => void;
};

/**
 * Draws and speaks a demo recording into an MP4 of 1280×720 at 30 pictures a second.
 * The file appears under its name when it is whole; stopped or failed, it leaves nothing behind.
 * @returns the times of everything that is said and shown, known by construction
 */
export async function drawDemoRecording(
  script: RecordingScript,
  outFile: string,
  options: Options = {},
): Promise<Timing> {
  const layout = await layOutScript(script, options);
  const soundFile = `${outFile}.pcm`;
  const partFile = `${outFile}.part`;
  try {
    await writeFile(soundFile, soundOf(layout), { signal: options.signal });
    await film(script, layout, soundFile, partFile, options);
    await rename(partFile, outFile);
  } finally {
    await rm(soundFile, { force: true });
    await rm(partFile, { force: true });
  }
  const { durationMs, captions, chapters, cues } = layout;
  return { durationMs, captions, chapters, cues };
}

/** The whole sound track, 16-bit mono. */
function soundOf(layout: Layout): Uint8Array {
  const samples = new Int16Array(Math.round((layout.durationMs * speechRate) / 1000));
  for (const { startMs, spoken } of layout.voices) {
    samples.set(spoken.samples, Math.round((startMs * speechRate) / 1000));
  }
  return new Uint8Array(samples.buffer);
}

/** Each picture is shown three times; key frames every 2 s let a player land quickly. */
function filmArguments(layout: Layout, soundFile: string, partFile: string): string[] {
  return [
    ...['-hide_banner', '-nostdin', '-v', 'error', '-y'],
    ...['-f', 'rawvideo', '-pix_fmt', 'rgba', '-s', `${picture.width}x${picture.height}`],
    ...['-r', String(picturesPerSecond), '-i', 'pipe:3'],
    ...['-f', 's16le', '-ar', String(speechRate), '-ac', '1', '-i', `file:${soundFile}`],
    ...['-vf', 'scale=1280:720:flags=fast_bilinear,fps=30,format=yuv420p'],
    ...['-c:v', 'libx264', '-preset', 'ultrafast', '-tune', 'stillimage', '-crf', '26', '-g', '60', '-threads', '2'],
    ...['-c:a', 'aac', '-ar', '44100', '-b:a', '64k', '-t', (layout.durationMs / 1000).toFixed(3)],
    ...['-map_metadata', '-1', '-fflags', '+bitexact', '-flags', '+bitexact', '-movflags', '+faststart', '-f', 'mp4'],
    `file:${partFile}`,
  ];
}

async function film(script: RecordingScript, layout: Layout, soundFile: string, partFile: string, options: Options) {
  const args = filmArguments(layout, soundFile, partFile);
  const ffmpeg = spawn('ffmpeg', args, {
    stdio: ['ignore', 'ignore', 'pipe', 'pipe'],
    signal: options.signal,
    killSignal: 'SIGKILL',
  });
  const pictures = ffmpeg.stdio[3] as Writable;
  let words = '';
  ffmpeg.stderr?.on('data', (bytes) => {
    words = (words + bytes).slice(-2000);
  });
  // a pipe that breaks because ffmpeg ended is told by its exit code below
  pictures.on('error', () => {});
  const ended = new Promise<number | null>((resolve, reject) => {
    ffmpeg.once('error', reject);
    ffmpeg.once('close', resolve);
  });
  const isOver = ended.then(
    () => true,
    () => true,
  );
  await sendPictures(script, layout, pictures, isOver, options);
  pictures.end();
  const code = await ended;
  options.signal?.throwIfAborted();
  if (code !== 0) throw new Error(`ffmpeg ended with ${code}: ${words.trim()}`);
}

async function sendPictures(
  script: RecordingScript,
  layout: Layout,
  pictures: Writable,
  isOver: Promise<boolean>,
  options: Options,
) {
  const dress = dresses[script.dress];
  const total = layout.durationMs / pictureMs;
  let told = -1;
  for (const [index, shot] of layout.shots.entries()) {
    const from = shot.startMs / pictureMs;
    const until = (layout.shots[index + 1]?.startMs ?? layout.durationMs) / pictureMs;
    // one loop is kept at a time: a picture is half a megabyte
    const loop = drawLoop(shot.motion, dress, script.place);
    for (let i = from; i < until; i++) {
      if (options.signal?.aborted || pictures.destroyed) return;
      const drawn = loop[(i - from) % loop.length];
      if (drawn && !pictures.write(drawn)) await Promise.race([once(pictures, 'drain').catch(() => {}), isOver]);
      const percent = Math.floor(((i + 1) / total) * 100);
      if (percent > told) {
        told = percent;
        options.onProgress?.(percent);
      }
    }
  }
}
