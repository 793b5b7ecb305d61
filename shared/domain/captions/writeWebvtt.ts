import type { Chapter } from '../chapters/chapter';
import { webvttTimestamp } from '../timecode';
import { inOrder } from './captionFaults';
import type { CaptionLine } from './captionLine';

/**
 * Text as a WebVTT payload that reads back as the same text.
 * Source: W3C WebVTT, "WebVTT cue text span": no line terminators of its own, no `&` and `<` unescaped, and never `-->`,
 * which escaping every `>` makes impossible; an empty line would end the cue.
 */
export function escapeWebvtt(text: string): string {
  return text
    .replaceAll('\0', '\uFFFD')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .split(/\r\n|\r|\n/)
    .filter((row) => row !== '')
    .join('\n');
}

type Block = { id?: string; startMs: number; endMs: number; text: string };

function writeBlocks(blocks: readonly Block[]): string {
  const written = blocks.map(
    ({ id, startMs, endMs, text }) =>
      `${id === undefined ? '' : `${id}\n`}${webvttTimestamp(startMs)} --> ${webvttTimestamp(endMs)}\n${escapeWebvtt(text)}\n`,
  );
  return ['WEBVTT\n', ...written].join('\n');
}

/** Caption lines as the text of a WebVTT file; sent as `text/vtt; charset=utf-8`. */
export function writeWebvtt(lines: readonly CaptionLine[]): string {
  return writeBlocks(inOrder(lines));
}

/**
 * Chapters as a WebVTT chapters file, each with its id.
 * Source: W3C WebVTT, "WebVTT file using chapter title text": titles are one line of text without tags; chapters follow one another.
 */
export function writeChaptersWebvtt(chapters: readonly Pick<Chapter, 'id' | 'startMs' | 'endMs' | 'title'>[]): string {
  const ordered = chapters.toSorted((a, b) => a.startMs - b.startMs);
  return writeBlocks(
    ordered.map(({ id, startMs, endMs, title }) => ({ id, startMs, endMs, text: title.replace(/\s+/g, ' ') })),
  );
}
