import webvtt, { type WebvttCue, type WebvttError } from 'webvtt-parser';
import { type CaptionFileReading, type FileFault, refused, rowsOf, warning } from './captionFile';
import { plainText } from './plainText';

const timeForm = 'A time is written like 00:04:31.200.';

/** The parser's errors that cost a timed line, in a coach's words. Errors about settings and headers cost nothing that is kept. */
const costly: Record<string, string> = {
  'No valid signature. (File needs to start with "WEBVTT".)': 'A WebVTT file starts with the word WEBVTT.',
  'No timestamp found.': 'A time is missing beside “-->”.',
  'Timestamp must start with a character in the range 0-9.': `There is “-->” here, but no time beside it. ${timeForm}`,
  'No time unit separator found.': `This time has no minutes. ${timeForm}`,
  'Must be exactly two digits.': `Minutes and seconds need two digits. ${timeForm}`,
  'No seconds found or minutes is greater than 59.': `This time has no seconds, or more than 59 minutes. ${timeForm}`,
  'No decimal separator (".") found.': `A full stop goes before the thousandths of a second. ${timeForm}`,
  'Milliseconds must be given in three digits.': `Thousandths of a second need three digits. ${timeForm}`,
  'You cannot have more than 59 minutes.': 'A time has more than 59 minutes.',
  'You cannot have more than 59 seconds.': 'A time has more than 59 seconds.',
  'No valid timestamp separator found.': 'Start and end are joined by “ --> ”.',
  'End timestamp is not greater than start timestamp.': 'This line ends when or before it starts.',
  'Cannot have timestamp in a comment.': 'A timed line stands inside a note. Put an empty line before it.',
  'Cannot have timestamp in a style block.': 'A timed line stands inside a style block. Put an empty line before it.',
};

const stray = new Set(['Cue identifier cannot be standalone.', 'Cue identifier needs to be followed by timestamp.']);
const lateStart = 'Start timestamp is not greater than or equal to start timestamp of previous cue.';

/**
 * Reads the text of a WebVTT file as the standard's own parser would, and says what such a parser passes over in silence.
 * Styles, regions, notes and cue settings are dropped.
 * @param text decoded and bounded in size and number of lines: the parser's time grows faster than its input
 */
export function readWebvtt(text: string): CaptionFileReading {
  const rows = withoutRegions(rowsOf(text)).map(withoutSettings);
  const { cues, errors } = parseFlat(rows.join('\n'));
  const faults = errors.flatMap((error) => faultOf(error, rows));
  const lineOf = linesByTimes(rows);

  const lines = cues.flatMap((cue) => {
    const startMs = Math.round(cue.startTime * 1000);
    const endMs = Math.round(cue.endTime * 1000);
    const line = lineOf(startMs, endMs);
    if (endMs <= startMs) return [];
    const words = plainText(payloadOf(cue));
    if (words === '') faults.push(warning(line, 'This line has times but no words; it was left out.'));
    return words === '' ? [] : [{ startMs, endMs, text: words, line }];
  });
  return { lines, faults };
}

/** With its markup escaped the parser builds no tree: nested tags would overflow its stack. `payloadOf` takes that back. */
function parseFlat(text: string) {
  const flat = text.replaceAll('&', '&amp;').replaceAll('<', '&lt;');
  return new webvtt.WebVTTParser({ '&amp;': '&', '&lt;': '<' }).parse(flat);
}

const payloadOf = (cue: WebvttCue) => cue.text.replaceAll('&lt;', '<').replaceAll('&amp;', '&');

/** The parser takes a REGION block for words without times; the standard says that it defines a region. */
function withoutRegions(rows: readonly string[]): string[] {
  let inside = false;
  return rows.map((row, i) => {
    if (row === '' || row.includes('-->')) inside = false;
    else if (i > 0 && rows[i - 1] === '' && /^REGION[ \t]*$/.test(row)) inside = true;
    return inside ? '' : row;
  });
}

/** Cue settings are dropped anyway, and the parser compares each with every other one on its row. */
const withoutSettings = (row: string) => row.replace(/^([ \t\f]*[\d:.]+[ \t\f]*-->[ \t\f]*[\d:.]+)[ \t\f].*$/, '$1');

function faultOf({ message, line }: WebvttError, rows: readonly string[]): FileFault[] {
  const reason = costly[message];
  if (reason) return [refused(line, reason)];
  if (message === lateStart)
    return [warning(line, 'This line started earlier than the one before it; it was moved up.')];
  if (!stray.has(message)) return [];
  // the parser names the row after the one without times
  const words = rows[line - 2] ?? '';
  return [warning(line - 1, `“${words.slice(0, 40)}” has no times; it was left out.`)];
}

/** Finds where a cue's times stand: the parser sorts its cues and doesn't say. Cues of the same times keep the file's order. */
function linesByTimes(rows: readonly string[]) {
  const places = new Map<string, number[]>();
  rows.forEach((row, i) => {
    const match = /^[ \t\f]*([\d:.]+)[ \t\f]*-->[ \t\f]*([\d:.]+)/.exec(row);
    if (!match) return;
    const key = `${timeOf(match[1])} ${timeOf(match[2])}`;
    const known = places.get(key);
    if (known) known.push(i + 1);
    else places.set(key, [i + 1]);
  });
  return (startMs: number, endMs: number) => places.get(`${startMs} ${endMs}`)?.shift() ?? 1;
}

const timeOf = (timestamp = '') =>
  Math.round(timestamp.split(':').reduce((total, part) => total * 60 + Number(part), 0) * 1000);
