import { once } from 'node:events';
import { rename, rm, writeFile } from 'node:fs/promises';
import { buffer } from 'node:stream/consumers';
import { accessUnits } from './accessUnits';
import { dresses } from './drawing/dresses';
import { drawLoop, picturesPerSecond } from './drawing/frames';
import { picture } from './drawing/place';
import { type FfmpegRun, runFfmpeg } from './ffmpegRun';
import { type Layout, layOutScript, type Timing } from './layOutScript';
import type { RecordingScript } from './script';
import { type Shot, shotsOf } from './shots';
import { speechRate } from './speech';

type Options = {
  signal?: AbortSignal;
  /** whole per cent, rising to 100 */
  onProgress?: (percent: number) => void;
};

/** Of the film; every drawn picture is shown three times. */
const framesPerSecond = 30;
const framesPerPicture = framesPerSecond / picturesPerSecond;

/**
 * Draws and speaks a demo recording into an MP4 of 1280×720 at 30 frames a second.
 * The file appears under its name when it is whole; stopped or failed, nothing is left behind.
 * @returns the times of everything that is said and shown, known by construction
 */
export async function drawDemoRecording(
  script: RecordingScript,
  outFile: string,
  options: Options = {},
): Promise<Timing> {
  const layout = await layOutScript(script, options);
  const [sound, film, part] = [`${outFile}.pcm`, `${outFile}.h264`, `${outFile}.part`];
  try {
    await writeFile(sound, soundOf(layout));
    await writeFile(film, await filmOf(script, shotsOf(layout), options));
    await runFfmpeg(joinArguments(film, sound, part, layout.durationMs), options.signal).ended;
    await rename(part, outFile);
  } finally {
    for (const file of [sound, film, part]) await rm(file, { force: true });
  }
  options.onProgress?.(100);
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

/** Films each shot once, then repeats and cuts its frames: a frame needs only those before it, back to a key frame. */
async function filmOf(script: RecordingScript, shots: readonly Shot[], options: Options): Promise<Buffer> {
  const run = runFfmpeg(filmArguments(shots), options.signal);
  const filmed = buffer(run.output);
  filmed.catch(() => {});
  await sendPictures(script, shots, run, options);
  await run.ended;
  const frames = accessUnits(await filmed);
  const drawn = shots.reduce((sum, shot) => sum + shot.drawn, 0);
  if (frames.length !== drawn * framesPerPicture)
    throw new Error(`Filmed ${frames.length} frames of ${drawn} pictures.`);
  let from = 0;
  const whole = shots.flatMap((shot) => {
    const once = frames.slice(from, from + shot.drawn * framesPerPicture);
    from += once.length;
    const times = Math.ceil(shot.shown / shot.drawn);
    return Array.from({ length: times }, () => once)
      .flat()
      .slice(0, shot.shown * framesPerPicture);
  });
  return Buffer.concat(whole);
}

/** No B-frames (ultrafast), so that frames may be cut anywhere; a key frame where each shot starts and every 2 s. */
function filmArguments(shots: readonly Shot[]): string[] {
  const starts = shots.map((_, i) => shots.slice(0, i).reduce((sum, shot) => sum + shot.drawn, 0) / picturesPerSecond);
  return [
    ...['-f', 'rawvideo', '-pix_fmt', 'rgba', '-s', `${picture.width}x${picture.height}`],
    ...['-r', String(picturesPerSecond), '-i', 'pipe:0'],
    ...['-vf', `scale=1280:720:flags=fast_bilinear,fps=${framesPerSecond},format=yuv420p`],
    ...['-c:v', 'libx264', '-preset', 'ultrafast', '-tune', 'stillimage', '-crf', '26', '-threads', '2'],
    ...['-g', String(framesPerSecond * 2), '-forced-idr', '1', '-force_key_frames', starts.join(',')],
    ...['-x264-params', 'aud=1:scenecut=0', '-f', 'h264', 'pipe:1'],
  ];
}

function joinArguments(film: string, sound: string, part: string, durationMs: number): string[] {
  return [
    '-nostdin',
    ...['-f', 'h264', '-framerate', String(framesPerSecond), '-i', `file:${film}`],
    ...['-f', 's16le', '-ar', String(speechRate), '-ac', '1', '-i', `file:${sound}`],
    ...['-c:v', 'copy', '-bsf:v', `setts=ts=N/${framesPerSecond}/TB`],
    ...['-c:a', 'aac', '-ar', '44100', '-b:a', '64k', '-t', (durationMs / 1000).toFixed(3)],
    ...['-map_metadata', '-1', '-fflags', '+bitexact', '-flags:a', '+bitexact', '-movflags', '+faststart', '-f', 'mp4'],
    `file:${part}`,
  ];
}

async function sendPictures(script: RecordingScript, shots: readonly Shot[], run: FfmpegRun, options: Options) {
  const total = shots.reduce((sum, shot) => sum + shot.drawn, 0);
  let isOver = false;
  const over = run.ended
    .catch(() => {})
    .then(() => {
      isOver = true;
    });
  let sent = 0;
  let told = 0;
  for (const shot of shots) {
    // one loop is kept at a time: a picture is half a megabyte
    const loop = drawLoop(shot.motion, dresses[script.dress], script.place);
    for (let i = 0; i < shot.drawn; i++) {
      const drawn = loop[i % loop.length];
      if (isOver || !drawn) return;
      if (!run.input.write(drawn)) await Promise.race([once(run.input, 'drain').catch(() => {}), over]);
      sent++;
      // the last hundredth is for joining picture and sound
      const percent = Math.floor((sent / total) * 99);
      if (percent > told) options.onProgress?.(percent);
      told = percent;
    }
  }
  run.input.end();
}
