import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { captionFaults } from '../../shared/domain/captions/captionFaults';
import { CaptionLine } from '../../shared/domain/captions/captionLine';
import { compareLineVersions } from '../../shared/domain/captions/compareVersions';
import {
  deleteLine,
  insertLine,
  joinWithNext,
  type LineEdit,
  moveTimes,
  setText,
  splitLine,
} from '../../shared/domain/captions/editLines';

const lines: CaptionLine[] = [
  { startMs: 1000, endMs: 3000, text: 'Feet under the hips' },
  { startMs: 3000, endMs: 5000, text: 'ribs down' },
  { startMs: 6000, endMs: 8000, text: 'and stand tall' },
];

function done(edit: LineEdit) {
  if ('refused' in edit) throw new Error(edit.refused);
  return edit;
}

const word = fc.stringMatching(/^[a-zé😀<&>-]{1,9}$/u);
const someLines = fc
  .array(
    fc.record({
      startMs: fc.integer({ min: 0, max: 60_000 }),
      lasts: fc.integer({ min: 2, max: 9000 }),
      words: fc.array(word, { minLength: 1, maxLength: 8 }),
    }),
    { minLength: 1, maxLength: 12 },
  )
  .map((drawn) =>
    drawn
      .map(({ startMs, lasts, words }) => ({ startMs, endMs: startMs + lasts, text: words.join(' ') }))
      .toSorted((a, b) => a.startMs - b.startMs || a.endMs - b.endMs),
  );

describe('splitting and joining caption lines', () => {
  it('cuts the time by the share of characters', () => {
    const { lines: cut, index } = done(splitLine(lines, 0, { character: 5 }));
    // 4 of 18 characters that are left: 2000 ms × 4/18
    expect(cut.slice(0, 2)).toEqual([
      { startMs: 1000, endMs: 1444, text: 'Feet' },
      { startMs: 1444, endMs: 3000, text: 'under the hips' },
    ]);
    expect(index).toBe(1);
  });

  it('cuts at the playhead when one is given, and refuses a playhead outside the line', () => {
    expect(done(splitLine(lines, 0, { character: 5, timeMs: 2500 })).lines[0]?.endMs).toBe(2500);
    expect(splitLine(lines, 0, { character: 5, timeMs: 3000 })).toHaveProperty('refused');
  });

  it('refuses to leave a line without words', () => {
    expect(splitLine(lines, 0, { character: 0 })).toHaveProperty('refused');
    expect(splitLine(lines, 0, { character: 999 })).toHaveProperty('refused');
  });

  it('never cuts a character in two', () => {
    const { lines: cut } = done(splitLine([{ startMs: 0, endMs: 900, text: 'up 💪💪 down' }], 0, { character: 6 }));
    expect(cut.map(({ text }) => text)).toEqual(['up 💪', '💪 down']);
  });

  it('joining the two halves gives the line back', () => {
    fc.assert(
      fc.property(someLines, fc.nat(), (given, n) => {
        const index = n % given.length;
        const line = given[index];
        const space = line?.text.indexOf(' ') ?? -1;
        fc.pre(space > 0);
        const alone = line ? [line] : [];
        const cut = done(splitLine(alone, 0, { character: space }));
        expect(done(joinWithNext(cut.lines, 0)).lines).toEqual(alone);
      }),
    );
  });

  it('refuses a joined line that is too long to keep, and a last line', () => {
    const long = [0, 1].map((n) => ({ startMs: n, endMs: n + 1, text: 'a'.repeat(300) }));
    expect(joinWithNext(long, 0)).toHaveProperty('refused');
    expect(joinWithNext(lines, 2)).toHaveProperty('refused');
  });
});

describe('every edit of caption lines', () => {
  it('keeps them in order, valid, and leaves what was given alone', () => {
    fc.assert(
      fc.property(someLines, fc.nat(), fc.nat(70_000), fc.nat(70_000), (given, n, from, to) => {
        const before = structuredClone(given);
        const index = n % given.length;
        const edits = [
          splitLine(given, index, { character: from % 20 }),
          joinWithNext(given, index),
          moveTimes(given, index, { startMs: from, endMs: to }),
          setText(given, index, ' other words '),
          insertLine(given, { startMs: from, endMs: to, text: 'new' }),
          deleteLine(given, index),
        ];
        for (const edit of edits) {
          if ('refused' in edit) continue;
          const refused = captionFaults(edit.lines, null).filter(({ severity }) => severity === 'refused');
          expect(refused).toEqual([]);
          expect(edit.lines.every((line) => CaptionLine.safeParse(line).success)).toBe(true);
        }
        expect(given).toEqual(before);
      }),
    );
  });

  it('follows a line to its new place', () => {
    const { lines: moved, index } = done(moveTimes(lines, 0, { startMs: 9000, endMs: 9500 }));
    expect(index).toBe(2);
    expect(moved[2]?.text).toBe('Feet under the hips');
  });

  it('refuses a line that ends before it starts, and one without words', () => {
    expect(moveTimes(lines, 0, { endMs: 1000 })).toEqual({ refused: 'A line ends after it starts.' });
    expect(setText(lines, 0, '  ')).toHaveProperty('refused');
    expect(deleteLine(lines, 3)).toHaveProperty('refused');
  });
});

describe('a caption line', () => {
  it('takes two rows and refuses an empty row, at once even where the text is long', () => {
    expect(CaptionLine.safeParse({ startMs: 0, endMs: 1, text: 'one\ntwo' }).success).toBe(true);
    expect(CaptionLine.safeParse({ startMs: 0, endMs: 1, text: 'one\n\ntwo' }).success).toBe(false);
    // a pattern with two ways to match would take years on this
    expect(CaptionLine.safeParse({ startMs: 0, endMs: 1, text: `${'a'.repeat(490)}\0b` }).success).toBe(false);
  });
});

describe('faults of caption lines', () => {
  it('names an overlap, a line past the end, one without length and one out of order', () => {
    const codes = (given: CaptionLine[], durationMs: number | null = null) =>
      captionFaults(given, durationMs).map(({ code, severity, index }) => [code, severity, index]);
    expect(codes(lines, 8000)).toEqual([]);
    expect(codes(lines, 7000)).toEqual([['pastEnd', 'warning', 2]]);
    expect(codes([{ startMs: 5, endMs: 5, text: 'x' }])).toEqual([['noLength', 'refused', 0]]);
    expect(codes(lines.toReversed())).toEqual([
      ['order', 'refused', 1],
      ['order', 'refused', 2],
    ]);
    expect(codes([{ startMs: 0, endMs: 9000, text: 'x' }, ...lines])).toEqual([
      ['overlap', 'warning', 1],
      ['overlap', 'warning', 2],
      ['overlap', 'warning', 3],
    ]);
  });
});

describe('two versions of caption lines', () => {
  const [first, second, third] = lines as [CaptionLine, CaptionLine, CaptionLine];

  it('shows what each changed, and a conflict only where both did and differ', () => {
    const mine = [{ ...first, text: 'Feet below the hips' }, second];
    const theirs = [
      { ...first, text: 'Feet beneath the hips' },
      second,
      third,
      { startMs: 9000, endMs: 9500, text: 'new' },
    ];
    expect(
      compareLineVersions(lines, mine, theirs).map(({ myChange, theirChange, conflict }) => [
        myChange,
        theirChange,
        conflict,
      ]),
    ).toEqual([
      ['changed', 'changed', true],
      ['removed', 'same', false],
      ['same', 'added', false],
    ]);
  });

  it('finds nothing between equal versions, and no conflict when only one side changed', () => {
    fc.assert(
      fc.property(someLines, someLines, (base, other) => {
        expect(compareLineVersions(base, base, base)).toEqual([]);
        expect(compareLineVersions(base, other, base).some(({ conflict }) => conflict)).toBe(false);
        expect(compareLineVersions(base, other, other).some(({ conflict }) => conflict)).toBe(false);
      }),
    );
  });

  it('accounts for every line of both versions that is not in the base', () => {
    fc.assert(
      fc.property(someLines, someLines, someLines, (base, mine, theirs) => {
        const rows = compareLineVersions(base, mine, theirs);
        const removed = rows.filter(({ myChange }) => myChange === 'removed').length;
        const added = rows.filter(({ myChange }) => myChange === 'added').length;
        expect(mine.length).toBe(base.length - removed + added);
      }),
    );
  });
});
