import { parseSync } from 'subtitle';
import { srtTimestamp } from '../../shared/domain/timecode';
import { type CaptionFileReading, type FileFault, refused, rowsOf, warning } from './captionFile';
import { plainText } from './plainText';

const time = String.raw`(?:(\d{1,3}):)?(\d{1,2}):(\d{1,2})(?:[.,](\d{1,3}))?`;
const timing = new RegExp(String.raw`^\s*${time}\s*-->\s*${time}(?:\s.*)?$`);

/** An arrow after something with a colon in it and no letters is meant as times; “squat --> stand” is not. */
const isMeantAsTimes = (row: string) => row.length < 100 && /^\s*-?\d[^a-z>]*:[^a-z>]*-->/i.test(row);

type Row = { text: string; line: number; isTiming: boolean };

/**
 * Reads the text of an SRT file. No standard describes the format; this takes what is found in use: a comma or a point before
 * one to three digits, no index, no empty line between, coordinates after the times, any order.
 * @param text decoded and bounded in size
 */
export function readSrt(text: string): CaptionFileReading {
  const faults: FileFault[] = [];
  const rows = regularRows(rowsOf(text), faults);
  const timings = rows.filter(({ isTiming }) => isTiming);
  const nodes = parseRows(rows, faults).filter((node) => node.type === 'cue');

  const lines = nodes.flatMap(({ data }, i) => {
    const line = timings[i]?.line ?? 1;
    if (data.end <= data.start) {
      faults.push(refused(line, 'This line ends when or before it starts.'));
      return [];
    }
    const words = plainText(data.text);
    if (words === '') faults.push(warning(line, 'This line has times but no words; it was left out.'));
    return words === '' ? [] : [{ startMs: data.start, endMs: data.end, text: words, line }];
  });
  const before = (i: number) => lines[i - 1]?.startMs ?? 0;
  lines.forEach(({ startMs, line }, i) => {
    if (startMs < before(i))
      faults.push(warning(line, 'This line started earlier than the one before it; it was moved up.'));
  });
  return { lines: lines.toSorted((a, b) => a.startMs - b.startMs || a.endMs - b.endMs), faults };
}

/** The rows in the one form that the parser reads without surprises, each with its line in the file. */
function regularRows(source: readonly string[], faults: FileFault[]): Row[] {
  return source.flatMap((text, i): Row[] => {
    const line = i + 1;
    const match = timing.exec(text);
    if (!match) {
      if (isMeantAsTimes(text))
        faults.push(refused(line, 'These times cannot be read. A time is written like 00:04:31,200.'));
      // the parser takes a row that starts with NOTE for a WebVTT comment and drops it; a space before it is trimmed later
      return [{ text: text.trim().startsWith('NOTE') ? ` ${text.trim()}` : text.trim(), line, isTiming: false }];
    }
    const start = timeOf(match.slice(1, 5));
    const end = timeOf(match.slice(5, 9));
    if (start === null || end === null) faults.push(refused(line, 'A time has more than 59 minutes or 59 seconds.'));
    const row = { text: `${srtTimestamp(start ?? 0)} --> ${srtTimestamp(end ?? 0)}`, line, isTiming: true };
    // times right below times: an empty row keeps the second from being taken for words
    return timing.test(source[i - 1] ?? '') ? [{ text: '', line, isTiming: false }, row] : [row];
  });
}

/** “1,5” is a second and a half, so digits are filled up from the right. */
function timeOf([hours = '0', minutes = '0', seconds = '0', fraction = '']: (string | undefined)[]): number | null {
  if (Number(minutes) > 59 || Number(seconds) > 59) return null;
  return ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1000 + Number(fraction.padEnd(3, '0'));
}

function parseRows(rows: readonly Row[], faults: FileFault[]) {
  const first = rows.findIndex(({ text }) => text !== '');
  const used = first < 0 ? [] : rows.slice(first);
  try {
    return parseSync(used.map(({ text }) => text).join('\n'));
  } catch (error) {
    const row = Number(/at row (\d+)/.exec(error instanceof Error ? error.message : '')?.[1] ?? 1);
    if (faults.length === 0)
      faults.push(refused(used[row - 1]?.line ?? 1, 'Times were expected here, like 00:04:31,200 --> 00:04:33,000.'));
    return [];
  }
}
