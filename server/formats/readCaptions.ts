import { captionFaults, inOrder } from '../../shared/domain/captions/captionFaults';
import { CaptionLine } from '../../shared/domain/captions/captionLine';
import { writeWebvtt } from '../../shared/domain/captions/writeWebvtt';
import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';
import { type FileFault, type LineInFile, refused, rowsOf, warning } from './captionFile';
import { decodeText } from './decodeText';
import { readSrt } from './readSrt';
import { readWebvtt } from './readWebvtt';

export type CaptionFile = {
  format: 'vtt' | 'srt';
  /** in order, plain text; none when the file is valid and has no lines */
  lines: CaptionLine[];
  /** what was changed or left out, for the person who chose the file; `line` counts from 1 */
  warnings: { line: number; reason: string }[];
};

/**
 * Reads a WebVTT or SRT file whole or not at all.
 * @param hint the file's name decides only where its content doesn't
 * @throws AppError `badFile` naming line and reason, `tooLarge`
 */
export function readCaptionFile(bytes: Uint8Array, hint: { fileName?: string } = {}): CaptionFile {
  if (bytes.length > limits.captionFileBytes)
    throw new AppError('tooLarge', { message: 'A caption file may have 2 MB at most.' });
  const { text, encoding } = decodeText(bytes);
  if (text.trim() === '') throw badFile('The file is empty.');

  const format = formatOf(text, hint.fileName);
  const timed = text.split('-->').length - 1;
  if (timed > limits.captionLinesPerRecording)
    throw badFile(
      `The file has ${timed} timed lines; ${limits.captionLinesPerRecording} are the most for one recording.`,
    );

  const reading = format === 'vtt' ? readWebvtt(text) : readSrt(text);
  const faults = reading.faults.concat(
    reading.lines.flatMap(unfit),
    encoding === 'windows-1252' ? encodingFault(format, bytes, text) : [],
  );
  throwIfRefused(faults);

  const inFile = inOrder(reading.lines);
  const lines = inFile.map(({ startMs, endMs, text: words }) => ({ startMs, endMs, text: words }));
  if (format === 'srt') checkAgain(lines);
  if (lines.length === 0) faults.push(warning(1, 'The file has no lines.'));
  for (const { code, index } of captionFaults(lines, null)) {
    const line = inFile[index]?.line;
    if (code === 'overlap' && line) faults.push(warning(line, 'This line starts before the one before it ends.'));
  }
  return { format, lines, warnings: worthReading(faults) };
}

/** In the file's order; nobody reads hundreds, and a hostile file can cause a million. */
function worthReading(faults: readonly FileFault[]): CaptionFile['warnings'] {
  const all = faults.toSorted((a, b) => a.line - b.line).map(({ line, reason }) => ({ line, reason }));
  const next = all[warningsShown];
  if (!next) return all;
  return [
    ...all.slice(0, warningsShown),
    { line: next.line, reason: `From here on there are ${all.length - warningsShown} more remarks.` },
  ];
}

const warningsShown = 100;

const badFile = (message: string) => new AppError('badFile', { message, fields: { file: message } });

function formatOf(text: string, fileName = ''): 'vtt' | 'srt' {
  if (/^\s*WEBVTT/.test(text)) return 'vtt';
  if (/\.vtt$/i.test(fileName))
    throw badFile(
      'Line 1: A WebVTT file starts with the word WEBVTT. If this is an SRT file, give it a name that ends in .srt.',
    );
  if (!text.includes('-->')) throw badFile('Line 1: This is neither a WebVTT nor an SRT file: it has no times.');
  return 'srt';
}

/** Old SRT files are often Windows-1252; WebVTT is always UTF-8 (W3C WebVTT, "WebVTT file"), so there it is damage. */
function encodingFault(format: 'vtt' | 'srt', bytes: Uint8Array, text: string): FileFault {
  const decoded = rowsOf(format === 'vtt' ? new TextDecoder('utf-8').decode(bytes) : text);
  const isOdd = format === 'vtt' ? /\ufffd/ : /[^\p{ASCII}]/u;
  const line = Math.max(1, decoded.findIndex((row) => isOdd.test(row)) + 1);
  return format === 'vtt'
    ? refused(line, 'A letter here is not UTF-8. Save the file as UTF-8 and try again.')
    : warning(line, 'The file is not UTF-8 and was read as Windows-1252. Check letters with accents.');
}

/** What fits a file but not a recording: too many words at once, a time after a whole day. */
function unfit({ line, ...captionLine }: LineInFile): FileFault[] {
  const parsed = CaptionLine.safeParse(captionLine);
  if (parsed.success) return [];
  const [issue] = parsed.error.issues;
  return [refused(line, issue?.path[0] === 'text' ? issue.message : 'This time is later than a day.')];
}

function throwIfRefused(faults: readonly FileFault[]): void {
  const found = faults.filter(({ severity }) => severity === 'refused').toSorted((a, b) => a.line - b.line);
  if (found.length === 0) return;
  const named = found.slice(0, 3).map(({ line, reason }) => `Line ${line}: ${reason}`);
  const more = found.length - named.length;
  throw badFile([...named, ...(more > 0 ? [`And ${more} more.`] : [])].join(' '));
}

/** SRT has no standard, so what was read of it must survive the parser of the standard that it is kept in. */
function checkAgain(lines: readonly CaptionLine[]): void {
  const again = readWebvtt(writeWebvtt(lines)).lines;
  const differs = lines.find((line, i) => again[i]?.text !== line.text || again[i]?.startMs !== line.startMs);
  if (differs || again.length !== lines.length)
    throw badFile(
      `The words “${(differs?.text ?? '').slice(0, 60)}” cannot be kept as they are. Change them and try again.`,
    );
}
