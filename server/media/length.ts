import { MediaFault } from './mediaFault';
import { runProbe } from './runProbe';

/**
 * The length in ms of a recording whose container doesn't tell it, as browsers write them: read to the end without decoding.
 * @throws MediaFault `truncated` when no packet has a time
 */
export async function measureLength(path: string, signal?: AbortSignal): Promise<number> {
  let end = 0;
  let rest = '';
  const { stderr } = await runProbe(
    path,
    ['-show_entries', 'packet=pts_time,duration_time', '-of', 'csv=p=0'],
    signal,
    (text) => {
      const lines = (rest + text).split('\n');
      rest = lines.pop() ?? '';
      for (const line of lines) end = Math.max(end, endOfPacket(line));
    },
  );
  end = Math.max(end, endOfPacket(rest));
  if (end === 0) throw new MediaFault('truncated', stderr);
  return Math.round(end * 1000);
}

/** @param line `pts_time,duration_time`, either of which may be `N/A` */
function endOfPacket(line: string): number {
  const [start = '', length = ''] = line.split(',');
  const seconds = Number.parseFloat(start);
  return Number.isFinite(seconds) ? seconds + (Number.parseFloat(length) || 0) : 0;
}
