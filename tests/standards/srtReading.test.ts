import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import type { CaptionFileReading } from '../../server/formats/captionFile';
import { plainText } from '../../server/formats/plainText';
import { readCaptionFile } from '../../server/formats/readCaptions';
import { readSrt } from '../../server/formats/readSrt';
import { readWebvtt } from '../../server/formats/readWebvtt';
import { AppError } from '../../shared/errors';

type NastyFile = { type: 'srt' | 'vtt'; input: string; expected: string };

// Source: 25 files on which public parsers disagree, with a reading of each that was agreed on by hand
const nastyFiles = fileURLToPath(new URL('../../../shared/data/webvtt/nasty.json', import.meta.url));
const nasty: Record<string, NastyFile> = existsSync(nastyFiles) ? JSON.parse(readFileSync(nastyFiles, 'utf8')) : {};

/** `1-2:Hello|3-4:World`, as the list of expectations writes it; ⏎ is a row's end. */
const written = ({ lines }: CaptionFileReading) =>
  lines.map(({ startMs, endMs, text }) => `${startMs / 1000}-${endMs / 1000}:${text.replaceAll('\n', '⏎')}`).join('|');

/** Where our lines differ from a payload as a file has it: plain text, no empty rows, no lines without words or length. */
const ourReading: Record<string, string> = {
  'S5 blank in text': '1-2:Hello⏎there|3-4:World',
  'S11 neg/zero dur': '5-6:Ok',
  'S15 empty cue': '3-4:World',
  'V2 no blank hdr': '1-2:Hello',
  'V3 voice+ents': "1-2:Knees & toes <3 'x'",
  'V6 no space arrow': '1-2:Hello',
  'V7 end<start': '',
  'V9 id arrow / text arrow': '1-2:A|3-4:B',
  'V10 not webvtt': '1-2:A',
};

/** Files that are refused whole, and why. */
const refusals: Record<string, RegExp> = {
  'S11 neg/zero dur': /^Line 2: This line ends .* Line 6: This line ends/,
  'S14 h>99': /^Line 2: This time is later than a day/,
  'V4 comma ms': /^Line 3: A full stop/,
  'V5 min 60': /^Line 3: A time has more than 59 minutes/,
  'V7 end<start': /^Line 3: This line ends/,
  'V10 not webvtt': /^Line 1: A WebVTT file starts/,
};

function refusal(bytes: Uint8Array, fileName?: string): string {
  try {
    readCaptionFile(bytes, fileName ? { fileName } : {});
  } catch (error) {
    if (error instanceof AppError && error.code === 'badFile') return error.message;
    throw error;
  }
  throw new Error('The file was taken.');
}

describe.skipIf(!existsSync(nastyFiles))(
  `files that parsers disagree on (skipped where ${nastyFiles} is absent)`,
  () => {
    it('are 25', () => {
      expect(Object.keys(nasty)).toHaveLength(25);
    });

    it.each(Object.entries(nasty))('%s: gives the expected times and words', (name, { type, input, expected }) => {
      const text = input.replace(/^\ufeff/, '');
      const expectedText = expected
        .split('|')
        .map((line) => line.replace(/:(.*)$/s, (_, payload: string) => `:${plainText(payload)}`))
        .join('|');
      expect(written(type === 'srt' ? readSrt(text) : readWebvtt(text))).toBe(ourReading[name] ?? expectedText);
    });

    it.each(Object.entries(nasty))('%s: is taken whole or refused with its line', (name, { type, input }) => {
      const bytes = new TextEncoder().encode(input);
      const reason = refusals[name];
      if (reason) expect(refusal(bytes, `talk.${type}`)).toMatch(reason);
      else expect(readCaptionFile(bytes, { fileName: `talk.${type}` })).toMatchObject({ format: type });
    });
  },
);

const hasPythonSrt = spawnSync('python3', ['-c', 'import srt']).status === 0;

/** python3-srt 3.5.2 takes the digits after the comma for milliseconds: “1,5” is 1005 there, and a second and a half here. */
const readOtherwise: Record<string, number[][]> = { 'S8 short ms': [[1005, 2025]] };

// Oracle: Debian's python3-srt
describe.skipIf(!hasPythonSrt)(
  'the same SRT files in python3-srt (skipped where that package is not installed)',
  () => {
    const script = `
import json, sys, srt
ms = lambda t: round(t.total_seconds() * 1000)
print(json.dumps([[ms(s.start), ms(s.end)] for s in sorted(srt.parse(sys.stdin.read(), ignore_errors=True)) if s.content.strip() and s.end > s.start]))`;

    it.each(Object.entries(nasty).filter(([, { type }]) => type === 'srt'))(
      '%s: has the same times',
      (name, { input }) => {
        const text = input.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n');
        const { stdout } = spawnSync('python3', ['-c', script], { input: text, encoding: 'utf8' });
        const ours = readSrt(text).lines.map(({ startMs, endMs }) => [startMs, endMs]);
        expect(JSON.parse(stdout)).toEqual(readOtherwise[name] ?? ours);
      },
    );
  },
);

describe('an SRT file', () => {
  const read = (text: string, fileName = 'talk.srt') => readCaptionFile(new TextEncoder().encode(text), { fileName });
  const one = '1\n00:00:01,000 --> 00:00:02,000\n';

  it('is known by its times when its name says nothing, and a name never overrules WEBVTT', () => {
    expect(readCaptionFile(new TextEncoder().encode(`${one}Hello\n`)).format).toBe('srt');
    expect(read('WEBVTT\n\n00:01.000 --> 00:02.000\nHello\n').format).toBe('vtt');
    expect(refusal(new TextEncoder().encode('just a letter\n'), 'talk.srt')).toMatch(/^Line 1: This is neither/);
    expect(refusal(new TextEncoder().encode(`${one}Hello\n`), 'talk.vtt')).toContain('ends in .srt');
  });

  it('keeps its words: a row that starts with NOTE, a script, a rule about arrows', () => {
    const { lines, warnings } = read(`${one}Look at this\nNOTEBOOK out\n<script>x</script>\nsquat --> stand\n`);
    expect(lines).toEqual([
      { startMs: 1000, endMs: 2000, text: 'Look at this\nNOTEBOOK out\n<script>x</script>\nsquat --> stand' },
    ]);
    expect(warnings).toEqual([]);
  });

  it('has its tags and places taken off', () => {
    expect(
      read(`${one}{\\an8}<font color="#ff0000">Knees</font> <b>out</b><br/>&amp; <3 {slowly}\n`).lines[0]?.text,
    ).toBe('Knees out\n& <3 {slowly}');
  });

  it('may have times right below times', () => {
    const { lines, warnings } = read('00:00:01,000 --> 00:00:02,000\n00:00:03,000 --> 00:00:04,000\nB\n');
    expect(lines).toEqual([{ startMs: 3000, endMs: 4000, text: 'B' }]);
    expect(warnings).toEqual([{ line: 1, reason: 'This line has times but no words; it was left out.' }]);
  });

  it.each([
    ['\n\n1\nHello\n\n2\n00:00:03,000 --> 00:00:04,000\nB\n', /^Line 4: Times were expected here/],
    [`${one}A\n\n2\n00:00:03:000 --> 00:00:04,000\nB\n`, /^Line 6: These times cannot be read/],
    [`${one}A\n\n2\n-00:00:03,000 --> 00:00:04,000\nB\n`, /^Line 6: These times cannot be read/],
    [`${one}A\n\n2\n00:61:03,000 --> 00:62:04,000\nB\n`, /^Line 6: A time has more than 59 minutes/],
    [`${one}A\n\n2\n00:00:03,000 --> 00:00:03,000\nB\n`, /^Line 6: This line ends when or before it starts/],
  ])('is refused whole, naming the line: %j', (text, message) => {
    expect(refusal(new TextEncoder().encode(text), 'talk.srt')).toMatch(message);
  });

  it('says which line it moved and which overlap', () => {
    const { lines, warnings } = read('1\n00:00:03,000 --> 00:00:04,000\nB\n\n2\n00:00:01,000 --> 00:00:03,500\nA\n');
    expect(lines.map(({ text }) => text)).toEqual(['A', 'B']);
    expect(warnings.map(({ line }) => line)).toEqual([2, 6]);
  });

  // Source: WHATWG Encoding, "BOM sniff", and its windows-1252 index (0xE9 é, 0x92 ’)
  it('is read as UTF-8, UTF-16 with its mark, or the Windows-1252 of older programs', () => {
    const text = `${one}Répète, it’s light\n`;
    const utf16le = Buffer.from(`\ufeff${text}`, 'utf16le');
    const old = Buffer.from(`${one}R\xe9p\xe8te, it\x92s light\n`, 'latin1');
    for (const bytes of [Buffer.from(text), Buffer.from(`\ufeff${text}`), utf16le, Buffer.from(utf16le).swap16(), old])
      expect(readCaptionFile(bytes).lines[0]?.text).toBe('Répète, it’s light');
    expect(readCaptionFile(old).warnings).toEqual([
      { line: 3, reason: 'The file is not UTF-8 and was read as Windows-1252. Check letters with accents.' },
    ]);
    expect(readCaptionFile(utf16le).warnings).toEqual([]);
  });

  it('shows a NUL as the mark for a letter that cannot be shown', () => {
    expect(read(`${one}a\0b\n`).lines[0]?.text).toBe('a\uFFFDb');
  });
});
