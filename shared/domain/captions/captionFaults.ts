import { formatMsWithTenths } from '../timecode';
import type { CaptionLine } from './captionLine';

export type CaptionFaultCode = 'noLength' | 'order' | 'overlap' | 'pastEnd';

export type CaptionFault = {
  code: CaptionFaultCode;
  /** `refused` cannot be saved; a `warning` never keeps anybody from saving */
  severity: 'refused' | 'warning';
  /** the line's place in the list that was given */
  index: number;
  otherIndex?: number;
  message: string;
};

/** In a caption file's order. Source: W3C WebVTT, "WebVTT cue timings": a start is never less than the start of a cue before it. */
export function inOrder<L extends Pick<CaptionLine, 'startMs' | 'endMs'>>(lines: readonly L[]): L[] {
  return lines.toSorted((a, b) => a.startMs - b.startMs || a.endMs - b.endMs);
}

/**
 * The faults in a recording's caption lines, in the order of the list.
 * Overlapping lines are legal WebVTT (two people talking), so they are only pointed out.
 * @param durationMs length of the recording, or null while it is not known
 */
export function captionFaults(lines: readonly CaptionLine[], durationMs: number | null): CaptionFault[] {
  let latest = -1;
  return lines.flatMap((line, index) => {
    const before = lines[index - 1];
    const other = latest >= 0 ? lines[latest] : undefined;
    const overlapped = latest;
    if (!other || line.endMs > other.endMs) latest = index;
    const faults: CaptionFault[] = [];
    const at = formatMsWithTenths(line.startMs);
    if (line.endMs <= line.startMs)
      faults.push({
        code: 'noLength',
        severity: 'refused',
        index,
        message: `The line at ${at} ends before it starts.`,
      });
    if (before && line.startMs < before.startMs)
      faults.push({
        code: 'order',
        severity: 'refused',
        index,
        otherIndex: index - 1,
        message: `The line at ${at} comes after a line that starts later.`,
      });
    else if (other && line.startMs < other.endMs)
      faults.push({
        code: 'overlap',
        severity: 'warning',
        index,
        otherIndex: overlapped,
        message: `The line at ${at} starts before the one at ${formatMsWithTenths(other.startMs)} ends.`,
      });
    if (durationMs !== null && line.endMs > durationMs)
      faults.push({
        code: 'pastEnd',
        severity: 'warning',
        index,
        message: `The line at ${at} goes on after the recording's end at ${formatMsWithTenths(durationMs)}.`,
      });
    return faults;
  });
}
