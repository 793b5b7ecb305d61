import { createRequire } from 'node:module';

/** HTML's named character references, which WebVTT takes over whole; with and without their semicolon. */
const named = new Map(
  Object.entries(createRequire(import.meta.url)('webvtt-parser/html-entities.json') as Record<string, string>),
);

/** WebVTT's own tags, its time tags, and those that SRT files use. Anything else in angle brackets is something that was said. */
const tag = /<\/?(?:c|i|b|u|s|ruby|rt|v|lang|font)(?:[.\s][^>]{0,300})?>|<\/?>|<\d{2,}:\d{2}(?::\d{2})?\.\d{3}>/gi;

/** `{\an8}` and its like: where on the screen a line stood, in old SRT files. */
const override = /\{\\[^{}]{0,300}\}/g;

/**
 * The words of a caption payload as plain text: tags dropped with their classes and voices, character references decoded,
 * `<script>` kept as the text that it is. Rows are trimmed; empty ones fall away.
 */
export function plainText(payload: string): string {
  return decodeReferences(
    payload
      .replace(/<br\s{0,9}\/?>/gi, '\n')
      .replace(tag, '')
      .replace(override, ''),
  )
    .replace(/\r\n?|\n/g, '\n')
    .split('\n')
    .map((row) => withoutControls(row).trim())
    .filter((row) => row !== '')
    .join('\n');
}

/** Tabs and no-break spaces are spaces to a reader; other control characters say nothing. */
function withoutControls(row: string): string {
  return row
    .replace(/[\t\f\u00a0]+/g, ' ')
    .replaceAll('\0', '\uFFFD')
    .replace(/[^\P{Cc}\n]/gu, '');
}

function decodeReferences(text: string): string {
  return text.replace(/&(?:#(\d{1,7})|#x([\da-f]{1,6})|[a-z\d]{1,40});/gi, (reference, decimal, hexadecimal) => {
    if (decimal === undefined && hexadecimal === undefined) return named.get(reference) ?? reference;
    const point = decimal === undefined ? Number.parseInt(hexadecimal, 16) : Number(decimal);
    const exists = point > 0 && point <= 0x10ffff && !(point >= 0xd800 && point <= 0xdfff);
    return exists ? String.fromCodePoint(point) : '\uFFFD';
  });
}
