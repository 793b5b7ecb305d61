import { describe, expect, it } from 'vitest';
import { readingProfiles } from '../../shared/domain/captions/readingProfile';
import { Chapter } from '../../shared/domain/chapters/chapter';
import { faultyPlaces, lineAt, lineFaults, placeFaults } from '../../src/features/captions/lineFaults';
import { blockNames } from '../../src/features/chapters/blockNames';
import { withOwnName } from '../../src/features/chapters/chapterNames';
import { refusalOf, rowFaults } from '../../src/features/chapters/rowFaults';

const id = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
const chapter = (n: number, more: Partial<Chapter> = {}) =>
  Chapter.parse({ id: id(n), startMs: n * 10_000, endMs: n * 10_000 + 10_000, kind: 'demo', title: 'Demo', ...more });

describe('the title of a chapter that nobody named', () => {
  const movements = new Map([
    [id(8), 'Ring row'],
    [id(9), 'Towel row'],
  ]);

  it('is its movement’s name once one is chosen, and follows it', () => {
    expect(withOwnName(chapter(1), { movementId: id(8) }, movements).title).toBe('Ring row');
    const named = chapter(1, { movementId: id(8), title: 'Ring row' });
    expect(withOwnName(named, { movementId: id(9) }, movements).title).toBe('Towel row');
    expect(withOwnName(named, { movementId: null }, movements).title).toBe('Demo');
  });

  it('is its kind where it shows no movement', () => {
    expect(withOwnName(chapter(1), { kind: 'cool-down' }, movements).title).toBe('Cool-down');
  });

  it('stays as somebody wrote it', () => {
    const named = chapter(1, { title: 'Rows, slowly', movementId: id(8) });
    expect(withOwnName(named, { movementId: id(9) }, movements)).toEqual({ movementId: id(9) });
    expect(withOwnName(named, { kind: 'workout' }, movements)).toEqual({ kind: 'workout' });
  });
});

describe('faults at a chapter’s row', () => {
  it('leave out the title and time that the row shows, and refuse only what cannot be stored', () => {
    const faults = rowFaults([chapter(1, { title: 'Ring row' })], 60_000, null);
    expect(faults.get(id(1))?.map(({ severity, message }) => [severity, message])).toEqual([
      ['warning', 'Shows no movement yet, so nobody finds it by name.'],
    ]);
    expect(refusalOf(faults)).toBeNull();
  });

  it('refuse a block of another session, once the session’s blocks are known', () => {
    const chapters = [chapter(1, { kind: 'workout', blockId: id(7) })];
    expect(refusalOf(rowFaults(chapters, 60_000, null))).toBeNull();
    expect(refusalOf(rowFaults(chapters, 60_000, new Set([id(7)])))).toBeNull();
    expect(refusalOf(rowFaults(chapters, 60_000, new Set([id(6)])))).toContain('block of another session');
  });

  it('refuse what goes on after the recording’s end', () => {
    expect(refusalOf(rowFaults([chapter(5)], 55_000, null))).toContain('after the recording');
  });
});

describe('blocks in a choice', () => {
  it('are told apart by kind and title, and by a number where both are the same', () => {
    const blocks = [
      { id: 'a', kind: 'warm-up', title: '' },
      { id: 'b', kind: 'workout', title: 'Ten rounds' },
      { id: 'c', kind: 'workout', title: 'Ten rounds' },
      { id: 'd', kind: 'cool-down', title: 'Cool-down' },
    ] as const;
    expect([...blockNames(blocks).values()]).toEqual([
      'Warm-up',
      'Workout · Ten rounds 1',
      'Workout · Ten rounds 2',
      'Cool-down',
    ]);
  });
});

describe('caption lines on the words page', () => {
  const line = (startMs: number, endMs: number, text = 'sit back into it') => ({ startMs, endMs, text });

  it('say a line that is too fast once, in words a minute', () => {
    // BBC Subtitle Guidelines §4: 160 to 180 words a minute; ten words in 0.9 s are 667
    const fast = line(0, 900, 'of you with both hands and sit back into it');
    expect(lineFaults(fast, readingProfiles.bbc, 'landscape').map(({ short }) => short)).toEqual([
      '667 words a min',
      '43 characters in a row',
    ]);
  });

  it('count what is too fast and list the places to look at, overlaps included', () => {
    const lines = [line(0, 3000), line(2000, 5000), line(5000, 5500)];
    const places = placeFaults(lines, 60_000);
    expect(faultyPlaces(lines, readingProfiles.bbc, 'landscape', places)).toEqual({ all: [1, 2], tooFast: 1 });
  });

  it('find the line that is said: its end is not part of it, of two the later one, none in a gap', () => {
    const lines = [line(0, 1000), line(1000, 9000), line(2000, 3000), line(10_000, 11_000)];
    expect([0, 999, 1000, 2500, 3500, 9000, 10_999, 11_000].map((ms) => lineAt(lines, ms))).toEqual([
      0, 0, 1, 2, 1, -1, 3, -1,
    ]);
    expect(lineAt([], 0)).toBe(-1);
  });
});
