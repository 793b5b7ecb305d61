import { existsSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import webvtt, { type WebvttNode } from 'webvtt-parser';
import { plainText } from '../../server/formats/plainText';
import { readCaptionFile } from '../../server/formats/readCaptions';
import { readWebvtt } from '../../server/formats/readWebvtt';
import { CaptionLine } from '../../shared/domain/captions/captionLine';
import { writeChaptersWebvtt, writeWebvtt } from '../../shared/domain/captions/writeWebvtt';
import { AppError } from '../../shared/errors';
import { limits } from '../../shared/limits';

const bytesOf = (text: string) => new TextEncoder().encode(text);
const parser = () => new webvtt.WebVTTParser({ '&amp;': '&', '&lt;': '<', '&gt;': '>' });

function refusalOf(read: () => unknown): AppError {
  try {
    read();
  } catch (error) {
    if (error instanceof AppError) return error;
    throw error;
  }
  throw new Error('The file was taken.');
}

type PlatformFile = { name: string; vttBase64: string; asserts: { path: string; value: unknown }[] };

// Source: web-platform-tests, webvtt/parsing/file-parsing (37 files with what a conforming parser reads from them)
const platformFiles = fileURLToPath(new URL('../../../shared/data/webvtt/file-parsing.json', import.meta.url));

describe.skipIf(!existsSync(platformFiles))(
  `web-platform-tests of WebVTT (skipped where ${platformFiles} is absent)`,
  () => {
    const files: PlatformFile[] = existsSync(platformFiles) ? JSON.parse(readFileSync(platformFiles, 'utf8')) : [];
    const textOf = (file: PlatformFile) => new TextDecoder().decode(Buffer.from(file.vttBase64, 'base64'));
    const asserted = (file: PlatformFile, path: RegExp) => file.asserts.filter((assert) => path.test(assert.path));
    /** Cues that a conforming parser keeps and a recording can't: nothing to read, or no time to read it in. */
    const unusable = /has times but no words|ends when or before it starts/;

    it('has all of the files', () => {
      expect(files).toHaveLength(37);
    });

    it.each(
      files.filter((file) => asserted(file, /^cues\.length$/).length > 0).map((file) => [file.name, file] as const),
    )('%s: reads as many cues, or says why one was left out', (_, file) => {
      const { lines, faults } = readWebvtt(textOf(file));
      const leftOut = faults.filter(({ reason }) => unusable.test(reason)).length;
      expect(lines.length + leftOut).toBe(asserted(file, /^cues\.length$/)[0]?.value);
    });

    const timed = files.filter((file) => asserted(file, /^cues\[\d+\]\.(startTime|endTime|text)$/).length > 0);
    it.each(timed.map((file) => [file.name, file] as const))('%s: reads the times and the words', (_, file) => {
      const { lines } = readWebvtt(textOf(file));
      for (const { path, value } of asserted(file, /^cues\[\d+\]\.(startTime|endTime|text)$/)) {
        const [, place, field] = /^cues\[(\d+)\]\.(\w+)$/.exec(path) ?? [];
        const line = lines[Number(place)];
        const read = { startTime: line && line.startMs / 1000, endTime: line && line.endMs / 1000, text: line?.text }[
          field ?? ''
        ];
        // words are kept without the blanks around them
        expect([path, read]).toEqual([path, typeof value === 'string' ? value.trim() : value]);
      }
    });

    it.each(['timings-60', 'timings-garbage', 'timings-negative', 'timings-too-long', 'timings-too-short', 'arrows'])(
      '%s: is refused whole, naming a line, because a timed line would be lost',
      (name) => {
        const file = files.find((one) => one.name === name);
        const error = refusalOf(() => readCaptionFile(Buffer.from(file?.vttBase64 ?? '', 'base64')));
        expect(error.code).toBe('badFile');
        expect(error.message).toMatch(/^Line \d+: /);
      },
    );
  },
);

describe('a WebVTT file', () => {
  const read = (text: string) => readCaptionFile(bytesOf(text), { fileName: 'talk.vtt' });
  const refusal = (text: string) => refusalOf(() => read(text)).message;
  const body = '00:01.000 --> 00:02.000\nHello\n';

  // Source: W3C WebVTT, "WebVTT file body": optional BOM, WEBVTT, then the end, a space or a tab, or a line terminator
  it.each(['WEBVTT', '\ufeffWEBVTT', 'WEBVTT - title', 'WEBVTT\ttitle'])('starts with %j', (start) => {
    expect(read(`${start}\n\n${body}`)).toEqual({
      format: 'vtt',
      lines: [{ startMs: 1000, endMs: 2000, text: 'Hello' }],
      warnings: [],
    });
  });

  it.each(['WEBVTTx', 'webvtt', ' WEBVTT', '\nWEBVTT', 'VTT'])('is refused when it starts with %j', (start) => {
    expect(refusal(`${start}\n\n${body}`)).toMatch(/^Line 1: A WebVTT file starts with the word WEBVTT/);
  });

  it('may have no lines, and says so', () => {
    for (const empty of ['WEBVTT', 'WEBVTT\n', '\ufeffWEBVTT\n\n\n', 'WEBVTT\n\nNOTE nothing yet\n'])
      expect(read(empty)).toEqual({
        format: 'vtt',
        lines: [],
        warnings: [{ line: 1, reason: 'The file has no lines.' }],
      });
  });

  it('is refused when it is empty', () => {
    for (const empty of ['', ' \n\n', '\ufeff']) expect(refusal(empty)).toBe('The file is empty.');
  });

  // Source: W3C WebVTT, "WebVTT style block", "WebVTT region definition block", "WebVTT comment block"
  it('leaves styles, regions, notes, ids and settings out without a word', () => {
    const { lines, warnings } = read(
      `WEBVTT\n\nSTYLE\n::cue { color: lime }\n\nREGION\nid:low\nwidth:40%\n\nNOTE a\nremark\n\nintro\n00:01.000 --> 00:02.000 region:low align:start line:0\nHello\n`,
    );
    expect(lines).toEqual([{ startMs: 1000, endMs: 2000, text: 'Hello' }]);
    expect(warnings).toEqual([]);
  });

  it('has its tags, voices and classes taken off, and its character references read', () => {
    const { lines } = read(
      'WEBVTT\n\n00:01.000 --> 00:09.000\n<v.loud Esme>Knees <c.yellow.bg_blue>out</c> &amp; <00:00:03.000><i>down</i> &lt;3&nbsp;&#39;x&#x1F4AA;</v>\n',
    );
    expect(lines[0]?.text).toBe("Knees out & down <3 'x💪");
  });

  // ASVS 5.0, 3.2.2: content that could be markup is shown as text
  it('keeps a script as the words that it is, and hands it out escaped', () => {
    const { lines } = read('WEBVTT\n\n00:01.000 --> 00:02.000\n<script>alert(1)</script>\nunder <10 kg & up\n');
    expect(lines[0]?.text).toBe('<script>alert(1)</script>\nunder <10 kg & up');
    expect(writeWebvtt(lines)).toContain('&lt;script&gt;alert(1)&lt;/script&gt;\nunder &lt;10 kg &amp; up');
  });

  it.each([
    ['00:00:02.000 --> 00:00:01.000', 'Line 3: This line ends when or before it starts.'],
    ['00:00:02.000 --> 00:00:02.000', 'Line 3: This line ends when or before it starts.'],
    ['00:00:01,000 --> 00:00:02,000', 'Line 3: A full stop goes before the thousandths'],
    ['00:60:00.000 --> 01:00:01.000', 'Line 3: A time has more than 59 minutes.'],
    ['00:00:01.00 --> 00:00:02.000', 'Line 3: Thousandths of a second need three digits.'],
    ['24:00:00.001 --> 24:00:01.000', 'Line 3: This time is later than a day.'],
    ['squat --> stand', 'Line 3: There is “-->” here, but no time beside it.'],
  ])('is refused with “%s” for its times', (times, message) => {
    expect(refusal(`WEBVTT\n\n${times}\nHello\n\n00:05.000 --> 00:06.000\nOk\n`)).toContain(message);
  });

  it('names up to three faults and counts the others', () => {
    const bad = '00:02.000 --> 00:01.000\nx\n\n'.repeat(5);
    expect(refusal(`WEBVTT\n\n${bad}`)).toMatch(/^Line 3: .* Line 6: .* Line 9: .* And 2 more\.$/);
  });

  it('is refused when a timed line is hidden in a note', () => {
    expect(refusal(`WEBVTT\n\nNOTE about this\n${body}`)).toMatch(/^Line 4: A timed line stands inside a note/);
  });

  it('is taken with a remark when lines overlap, come out of order, are empty, or words have no times', () => {
    const { lines, warnings } = read(
      'WEBVTT\n\n00:03.000 --> 00:05.000\nB\n\nthere\n\n00:01.000 --> 00:04.000\nA\n\n00:06.000 --> 00:07.000\n<i></i>\n',
    );
    expect(lines.map(({ text }) => text)).toEqual(['A', 'B']);
    expect(warnings).toEqual([
      { line: 3, reason: 'This line starts before the one before it ends.' },
      { line: 6, reason: '“there” has no times; it was left out.' },
      { line: 8, reason: 'This line started earlier than the one before it; it was moved up.' },
      { line: 11, reason: 'This line has times but no words; it was left out.' },
    ]);
  });

  // Source: W3C WebVTT, "WebVTT file": UTF-8
  it('is refused, naming the line, when it is not UTF-8', () => {
    const bytes = Buffer.from('WEBVTT\n\n00:01.000 --> 00:02.000\nr\xe9p\xe9te\n', 'latin1');
    expect(refusalOf(() => readCaptionFile(bytes)).message).toMatch(/^Line 4: A letter here is not UTF-8/);
  });

  it('is refused when it is too large, has too many lines, or a line is too long to keep', () => {
    expect(refusalOf(() => readCaptionFile(new Uint8Array(limits.captionFileBytes + 1))).code).toBe('tooLarge');
    expect(refusal(`WEBVTT\n\n${body.repeat(limits.captionLinesPerRecording + 1)}`)).toContain('6001 timed lines');
    expect(refusal(`WEBVTT\n\n00:01.000 --> 00:02.000\n${'a'.repeat(501)}\n`)).toBe('Line 3: At most 500 characters.');
  });

  it('comes to an end on files that are made to overwhelm a parser', () => {
    for (const hostile of ['<b>'.repeat(30_000), '&a;'.repeat(30_000), '<c '.repeat(30_000), 'a\n'.repeat(30_000)]) {
      expect(() => readWebvtt(`WEBVTT\n\n00:01.000 --> 00:02.000\n${hostile}`)).not.toThrow();
      expect(() => readWebvtt(`WEBVTT\n\n${hostile}`)).not.toThrow();
    }
    const settings = Array.from({ length: 60_000 }, (_, i) => `a${i}:b`).join(' ');
    expect(read(`WEBVTT\n\n00:01.000 --> 00:02.000 ${settings}\nHello`).lines).toHaveLength(1);
  });

  it('gives the words that webvtt-parser shows, whatever tags are around them', () => {
    const word = fc.constantFrom('ribs', 'down & up', 'x < 3', 'é', '1 > 0', ' ');
    const marked = fc.letrec<{ node: string }>((tie) => ({
      node: fc.oneof(
        { maxDepth: 4 },
        word.map((text) => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;')),
        fc
          .tuple(
            fc.constantFrom('c', 'c.red.bg_lime', 'i', 'b', 'u', 'v Esme', 'lang en'),
            fc.array(tie('node'), { maxLength: 3 }),
          )
          .map(([tag, inner]) => `<${tag}>${inner.join('')}</${/^\w+/.exec(tag)?.[0]}>`),
      ),
    })).node;
    const shown = (nodes: readonly WebvttNode[]): string =>
      nodes
        .map((node) => (node.type === 'text' ? node.value : node.type === 'object' ? shown(node.children) : ''))
        .join('');
    fc.assert(
      fc.property(marked, (payload) => {
        const [cue] = parser().parse(`WEBVTT\n\n00:01.000 --> 00:02.000\n${payload}\n`).cues;
        expect(plainText(payload)).toBe(shown(cue?.tree.children ?? []).trim());
      }),
    );
  });
});

describe('a WebVTT file of ours', () => {
  const row = fc
    .string({ unit: 'grapheme', minLength: 1, maxLength: 30 })
    .map((text) => `a${text.replace(/\p{C}|\s/gu, '_')}`);
  const awkward = fc.constantFrom(
    '-->',
    'NOTE x',
    'WEBVTT',
    'STYLE',
    '00:01.000 --> 00:02.000',
    '<v A>b</v>',
    '&amp;',
    '&lt',
    '<script>',
    '1',
  );
  const line = fc
    .record({
      startMs: fc.integer({ min: 0, max: 86_000_000 }),
      lasts: fc.integer({ min: 1, max: 9000 }),
      rows: fc.array(fc.oneof(row, awkward), { minLength: 1, maxLength: 3 }),
    })
    .map(({ startMs, lasts, rows }) => CaptionLine.parse({ startMs, endMs: startMs + lasts, text: rows.join('\n') }));

  // Oracle: webvtt-parser 2.2.0, which passes all 24 core files of web-platform-tests
  it('reads back in webvtt-parser as the same times and words, without one error', () => {
    fc.assert(
      fc.property(fc.array(line, { maxLength: 8 }), (lines) => {
        const { cues, errors } = parser().parse(writeWebvtt(lines));
        expect(errors).toEqual([]);
        const ordered = lines.toSorted((a, b) => a.startMs - b.startMs || b.endMs - a.endMs);
        expect(
          cues.map(({ startTime, endTime, tree }) => ({
            startMs: Math.round(startTime * 1000),
            endMs: Math.round(endTime * 1000),
            text: tree.children.map((node) => (node.type === 'text' ? node.value : '?')).join(''),
          })),
        ).toEqual(ordered);
      }),
    );
  });

  it('reads back in our own reader as the same lines', () => {
    fc.assert(
      fc.property(fc.array(line, { minLength: 1, maxLength: 8 }), (lines) => {
        const again = readCaptionFile(bytesOf(writeWebvtt(lines))).lines;
        expect(again).toEqual(lines.toSorted((a, b) => a.startMs - b.startMs || a.endMs - b.endMs));
      }),
    );
  });

  it('holds no “-->” but between times', () => {
    fc.assert(
      fc.property(line, (one) => {
        const rows = writeWebvtt([one])
          .split('\n')
          .filter((text) => text.includes('-->'));
        expect(rows).toHaveLength(1);
      }),
    );
  });

  // Source: W3C WebVTT, "WebVTT file using chapter title text": checked by webvtt-parser in its chapters mode
  it('holds chapters with their ids and titles', () => {
    const file = writeChaptersWebvtt([
      { id: 'b', startMs: 60_000, endMs: 90_000, title: 'Rows & <holds> --> rest' },
      { id: 'a', startMs: 0, endMs: 60_000, title: 'Briefing' },
    ]);
    const { cues, errors } = parser().parse(file, 'chapters');
    expect(errors).toEqual([]);
    expect(cues.map(({ id, startTime, endTime, tree }) => [id, startTime, endTime, tree.children])).toMatchObject([
      ['a', 0, 60, [{ value: 'Briefing' }]],
      ['b', 60, 90, [{ value: 'Rows & <holds> --> rest' }]],
    ]);
  });
});
