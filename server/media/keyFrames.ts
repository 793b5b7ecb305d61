import { MediaFault } from './mediaFault';
import { runProbe } from './runProbe';

/** A camera keeps its rhythm; two minutes of it tell the rest, and reading them costs no decoding. */
const readSeconds = 120;

/**
 * The longest stretch without a key frame at the start of a recording, in ms. A player decodes from the key frame before
 * the place that was asked for, so this is what a seek costs.
 * @param stream the picture's index
 */
export async function longestKeyFrameGapMs(path: string, stream: number, signal?: AbortSignal): Promise<number> {
  const { exit, stdout, stderr } = await runProbe(
    path,
    [
      '-select_streams',
      String(stream),
      '-read_intervals',
      `%+${readSeconds}`,
      '-show_entries',
      'packet=pts_time,flags',
      '-of',
      'csv=p=0',
    ],
    signal,
  );
  if (exit !== 0) throw new MediaFault('unsupported', stderr);
  return longestGap(stdout);
}

/** @param listed a line `pts_time,flags` for each packet; `K` marks a key frame */
export function longestGap(listed: string): number {
  let lastKey = 0;
  let last = 0;
  let longest = 0;
  for (const line of listed.split('\n')) {
    const [time = '', flags = ''] = line.split(',');
    const ms = Number.parseFloat(time) * 1000;
    if (!Number.isFinite(ms)) continue;
    last = Math.max(last, ms);
    if (!flags.startsWith('K')) continue;
    longest = Math.max(longest, ms - lastKey);
    lastKey = ms;
  }
  return Math.round(Math.max(longest, last - lastKey));
}
