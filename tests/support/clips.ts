import { execFile } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { readFile, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';

/** Small clips that ffmpeg draws and plays by itself: made once a run, in a folder that goes with the process. */

let folder: string | undefined;

/** Where this run's clips lie. */
export function clipFolder(): string {
  if (folder !== undefined) return folder;
  const made = mkdtempSync(join(tmpdir(), 'tapeline-clips-'));
  process.once('exit', () => rmSync(made, { recursive: true, force: true }));
  folder = made;
  return made;
}

/** Takes the clips away before the process ends; the next one asked for is made anew. */
export function removeClips() {
  if (folder !== undefined) rmSync(folder, { recursive: true, force: true });
  folder = undefined;
  made.clear();
}

const run = promisify(execFile);
const made = new Map<string, Promise<string>>();

/** A moving test picture with a counter of seconds. */
export const drawn = (size: string, seconds: number, rate = '30') => [
  '-f',
  'lavfi',
  '-i',
  `testsrc=size=${size}:rate=${rate}:duration=${seconds}`,
];

/** A tone; the layout is one of ffmpeg's: `mono`, `stereo`, `5.1`. */
export const played = (seconds: number, layout = 'stereo') => [
  '-f',
  'lavfi',
  '-i',
  `sine=frequency=440:sample_rate=48000:duration=${seconds},aformat=channel_layouts=${layout}`,
];

export const h264 = (keyFrameEvery = 60) => [
  '-c:v',
  'libx264',
  '-preset',
  'ultrafast',
  '-pix_fmt',
  'yuv420p',
  '-g',
  String(keyFrameEvery),
  '-threads',
  '1',
];

export const aac = ['-c:a', 'aac', '-b:a', '64k'];

/**
 * A clip made by ffmpeg from the given arguments, once for each name.
 * @param name with its ending, which says the container
 * @returns its absolute path
 */
export function clip(name: string, args: readonly string[]): Promise<string> {
  const path = join(clipFolder(), name);
  const known = made.get(path);
  if (known) return known;
  const making = run('ffmpeg', ['-hide_banner', '-nostdin', '-v', 'error', '-y', ...args, path]).then(() => path);
  made.set(path, making);
  return making;
}

/** What a phone gives: 4 s of H.264 and AAC, the index in front. */
export const phoneClip = () =>
  clip('phone.mp4', [...drawn('640x360', 4), ...played(4), ...h264(), ...aac, '-movflags', '+faststart']);

/** A file of given bytes under a given name. */
export async function fileOf(name: string, content: string | Uint8Array): Promise<string> {
  const path = join(clipFolder(), name);
  await writeFile(path, content);
  return path;
}

/**
 * The same MP4, held upright while filming: its picture is to be turned a quarter clockwise.
 * Source: ISO/IEC 14496-12, 8.3.2: the track header's matrix {a, b, u, c, d, v, x, y, w} maps (p, q) to (ap + cq + x, bp + dq + y).
 */
export async function heldUpright(name: string, path: string): Promise<string> {
  const bytes = await readFile(path);
  // size, type, version and flags, five fields of 32 bits, 8 bytes reserved, four fields of 16 bits
  const matrix = bytes.indexOf('tkhd', 0, 'latin1') - 4 + 48;
  for (const [i, value] of [0, 0x10000, 0, -0x10000, 0, 0, 0, 0, 0x40000000].entries())
    bytes.writeInt32BE(value, matrix + 4 * i);
  return fileOf(name, bytes);
}
