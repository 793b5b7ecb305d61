import { randomUUID } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { Chapter } from '../../shared/domain/chapters/chapter';
import {
  chapterAt,
  cuesAround,
  isInAside,
  nextChapter,
  previousChapter,
  visibleToMembers,
} from '../../shared/domain/chapters/chapterAt';
import { canBeSaved, chapterFaults } from '../../shared/domain/chapters/chapterRules';
import { compareChapterVersions } from '../../shared/domain/chapters/compareVersions';
import {
  type ChapterEdit,
  endChapterAt,
  joinWithNextChapter,
  moveEdge,
  nudgeEdge,
  removeChapter,
  setFields,
  splitChapterAt,
  startChapterAt,
} from '../../shared/domain/chapters/editChapters';
import { redo, startHistory, takeStep, undo } from '../../shared/domain/history';

const durationMs = 120_000;

function chapter(startMs: number, endMs: number, more: Partial<Chapter> = {}): Chapter {
  return Chapter.parse({ id: randomUUID(), startMs, endMs, kind: 'warm-up', title: `From ${startMs}`, ...more });
}

function done(edit: ChapterEdit) {
  if ('refused' in edit) throw new Error(edit.refused);
  return edit;
}

const spans = (edit: ChapterEdit) => done(edit).chapters.map(({ startMs, endMs }) => [startMs, endMs]);
const codes = (chapters: Chapter[], length: number | null = durationMs) =>
  chapterFaults(chapters, length).map(({ code, severity }) => `${code} ${severity}`);

/** Valid chapters: cut points in order, taken two by two, now and then without a gap. */
const someChapters = fc
  .uniqueArray(fc.integer({ min: 0, max: durationMs / 100 }), { minLength: 2, maxLength: 14 })
  .chain((cuts) =>
    fc.tuple(fc.constant(cuts.toSorted((a, b) => a - b)), fc.array(fc.boolean(), { minLength: 14, maxLength: 14 })),
  )
  .map(([cuts, kept]) =>
    cuts.slice(1).flatMap((cut, i) => (kept[i] || i === 0 ? [chapter((cuts[i] ?? 0) * 100, cut * 100)] : [])),
  );

describe('rules of chapters', () => {
  // Source: W3C WebVTT, "WebVTT file using chapter title text": one after another or strictly nested; 0–60 with 30–90 is invalid
  it('refuses 0–60 with 30–90, in any order, naming both', () => {
    const [a, b] = [chapter(0, 60_000), chapter(30_000, 90_000)];
    const faults = chapterFaults([b, a], durationMs);
    expect(faults).toHaveLength(1);
    expect(faults[0]).toMatchObject({ code: 'overlap', severity: 'refused', chapterId: b.id, otherId: a.id });
    expect(canBeSaved(faults)).toBe(false);
  });

  it('refuses a chapter inside another, even with one between them in the order', () => {
    expect(codes([chapter(0, 90_000), chapter(10_000, 20_000), chapter(30_000, 40_000)])).toEqual([
      'overlap refused',
      'overlap refused',
    ]);
  });

  it('takes chapters that touch, and gaps', () => {
    expect(codes([chapter(0, 30_000), chapter(30_000, 60_000), chapter(70_000, durationMs)])).toEqual([]);
  });

  it('refuses a chapter past the end and one without length, and only remarks on a very short one', () => {
    expect(codes([chapter(0, durationMs + 1)])).toEqual(['pastEnd refused']);
    expect(codes([chapter(0, durationMs + 1)], null)).toEqual([]);
    expect(codes([chapter(500, 500)])).toEqual(['noLength refused']);
    expect(codes([chapter(0, 999)])).toEqual(['tooShort warning']);
    expect(codes([chapter(0, 1000)])).toEqual([]);
  });

  it('refuses the same chapter twice', () => {
    const one = chapter(0, 5000);
    expect(codes([one, { ...one, startMs: 5000, endMs: 9000 }])).toEqual(['sameId refused']);
  });

  it('remarks on a demo and a substitution that lead nowhere, and lets them be saved', () => {
    expect(codes([chapter(0, 5000, { kind: 'demo' })])).toEqual(['demoWithoutMovement warning']);
    const bare = chapterFaults([chapter(0, 5000, { kind: 'substitution' })], durationMs);
    expect(bare.map(({ code }) => code)).toEqual([
      'substitutionWithoutMovement',
      'substitutionWithoutOriginal',
      'substitutionWithoutMissing',
    ]);
    expect(canBeSaved(bare)).toBe(true);
    const ids = { movementId: randomUUID(), standsInForMovementId: randomUUID() };
    expect(codes([chapter(0, 5000, { kind: 'substitution', ...ids, missing: 'kit' })])).toEqual([
      'missingKitUnnamed warning',
    ]);
    expect(codes([chapter(0, 5000, { kind: 'substitution', ...ids, missing: 'space' })])).toEqual([]);
  });
});

describe('marking chapters', () => {
  const fresh = () => ({ id: randomUUID(), kind: 'demo' as const, title: 'Untitled' });

  it('starts a chapter at the playhead and ends the one before there', () => {
    const first = startChapterAt([], 10_000, fresh(), durationMs);
    expect(spans(first)).toEqual([[10_000, durationMs]]);
    expect(spans(startChapterAt(done(first).chapters, 40_000.4, fresh(), durationMs))).toEqual([
      [10_000, 40_000],
      [40_000, durationMs],
    ]);
  });

  it('starts a chapter in a gap and lets it go on to the next one', () => {
    const marked = [chapter(0, 10_000), chapter(50_000, 60_000)];
    expect(spans(startChapterAt(marked, 20_000, fresh(), durationMs))[1]).toEqual([20_000, 50_000]);
  });

  it('refuses a second chapter at the same moment, and one at the very end', () => {
    expect(startChapterAt([chapter(0, 10_000)], 0, fresh(), durationMs)).toHaveProperty('refused');
    expect(startChapterAt([], durationMs, fresh(), durationMs)).toHaveProperty('refused');
  });

  it('ends the chapter that plays, or lets the last one go on to the playhead', () => {
    expect(spans(endChapterAt([chapter(0, 60_000)], 30_000, durationMs))).toEqual([[0, 30_000]]);
    expect(spans(endChapterAt([chapter(0, 10_000), chapter(50_000, 60_000)], 30_000, durationMs))[0]).toEqual([
      0, 30_000,
    ]);
    expect(endChapterAt([chapter(50_000, 60_000)], 30_000, durationMs)).toHaveProperty('refused');
  });

  it('stops a nudged edge at its neighbours, its other edge and the recording', () => {
    const [a, b] = [chapter(0, 10_000), chapter(10_500, durationMs)];
    expect(spans(nudgeEdge([a, b], a.id, 'end', 1000, durationMs))[0]).toEqual([0, 10_500]);
    expect(spans(nudgeEdge([a, b], a.id, 'start', -100, durationMs))[0]).toEqual([0, 10_000]);
    expect(spans(nudgeEdge([a, b], b.id, 'end', 1000, durationMs))[1]).toEqual([10_500, durationMs]);
    expect(spans(moveEdge([a, b], a.id, 'start', 99_000, durationMs))[0]).toEqual([9900, 10_000]);
  });

  it('splits into two that say the same, and joining them gives the first back', () => {
    const one = chapter(0, 60_000, { kind: 'demo', movementId: randomUUID(), note: 'Mind the floor.' });
    const cut = done(splitChapterAt([one], 20_000, randomUUID()));
    expect(cut.chapters.map(({ movementId }) => movementId)).toEqual([one.movementId, one.movementId]);
    expect(done(joinWithNextChapter(cut.chapters, one.id)).chapters).toEqual([one]);
    expect(splitChapterAt([one], 50, randomUUID())).toHaveProperty('refused');
  });

  it('keeps both notes when joining, and refuses when they are too long together', () => {
    const [a, b] = [chapter(0, 1000, { note: 'one' }), chapter(2000, 3000, { note: 'two' })];
    expect(done(joinWithNextChapter([a, b], a.id)).chapters).toMatchObject([
      { startMs: 0, endMs: 3000, note: 'one\ntwo' },
    ]);
    const long = [chapter(0, 1000, { note: 'x'.repeat(900) }), chapter(1000, 2000, { note: 'y'.repeat(900) })] as const;
    expect(joinWithNextChapter(long, long[0].id)).toHaveProperty('refused');
  });

  it('drops what only a substitution says when the kind changes', () => {
    const one = chapter(0, 5000, {
      kind: 'substitution',
      missing: 'kit',
      missingKitItemId: randomUUID(),
      standsInForMovementId: randomUUID(),
    });
    expect(done(setFields([one], one.id, { missing: 'space' })).chapters[0]?.missingKitItemId).toBeNull();
    expect(done(setFields([one], one.id, { kind: 'demo' })).chapters[0]).toMatchObject({
      missing: null,
      missingKitItemId: null,
      standsInForMovementId: null,
    });
    expect(setFields([one], one.id, { title: ' ' })).toEqual({ refused: 'Write something here.' });
  });

  const someEdit = fc.record({
    kind: fc.constantFrom('start', 'end', 'move', 'nudge', 'split', 'join', 'remove', 'fields'),
    which: fc.nat(20),
    ms: fc.integer({ min: -5000, max: durationMs + 5000 }),
    edge: fc.constantFrom('start' as const, 'end' as const),
    step: fc.constantFrom(-1000, -100, 100, 1000),
  });

  function apply(chapters: Chapter[], edit: typeof someEdit extends fc.Arbitrary<infer E> ? E : never): Chapter[] {
    const id = chapters[edit.which % Math.max(1, chapters.length)]?.id ?? randomUUID();
    const edits: Record<typeof edit.kind, () => ChapterEdit> = {
      start: () => startChapterAt(chapters, edit.ms, { id: randomUUID(), kind: 'demo', title: 'New' }, durationMs),
      end: () => endChapterAt(chapters, edit.ms, durationMs),
      move: () => moveEdge(chapters, id, edit.edge, edit.ms, durationMs),
      nudge: () => nudgeEdge(chapters, id, edit.edge, edit.step, durationMs),
      split: () => splitChapterAt(chapters, edit.ms, randomUUID()),
      join: () => joinWithNextChapter(chapters, id),
      remove: () => removeChapter(chapters, id),
      fields: () => setFields(chapters, id, { title: 'Other' }),
    };
    const result = edits[edit.kind]();
    return 'refused' in result ? chapters : result.chapters;
  }

  it('keeps order, keeps clear of overlaps and stays in the recording, whatever is done', () => {
    fc.assert(
      fc.property(someChapters, fc.array(someEdit, { maxLength: 15 }), (start, edits) => {
        const end = edits.reduce(apply, start);
        expect(canBeSaved(chapterFaults(end, durationMs))).toBe(true);
        expect(end).toEqual(end.toSorted((a, b) => a.startMs - b.startMs));
      }),
    );
  });

  it('undoing every edit gives the same chapters, and redoing them the same result', () => {
    fc.assert(
      fc.property(someChapters, fc.array(someEdit, { maxLength: 15 }), (start, edits) => {
        const before = structuredClone(start);
        const history = edits.reduce((steps, edit) => takeStep(steps, apply(steps.present, edit)), startHistory(start));
        const undone = edits.reduce((steps) => undo(steps), history);
        expect(undone.present).toEqual(before);
        expect(edits.reduce((steps) => redo(steps), undone)).toEqual(history);
      }),
    );
  });

  it('a new step forgets what was undone, and undoing nothing changes nothing', () => {
    const history = takeStep(takeStep(startHistory('a'), 'b'), 'c');
    expect(takeStep(undo(history), 'd')).toEqual({ past: ['a', 'b'], present: 'd', future: [] });
    const untouched = startHistory('a');
    expect(undo(untouched)).toBe(untouched);
    expect(redo(untouched)).toBe(untouched);
    expect(takeStep(untouched, 'a')).toBe(untouched);
  });
});

describe('chapters while watching', () => {
  const [a, b, c] = [chapter(0, 10_000), chapter(10_000, 20_000, { kind: 'aside' }), chapter(30_000, 40_000)] as const;
  const all = [c, a, b];

  it('finds the chapter that plays; an end belongs to what follows', () => {
    expect(chapterAt(all, 9999)).toBe(a);
    expect(chapterAt(all, 10_000)).toBe(b);
    expect(chapterAt(all, 25_000)).toBeUndefined();
  });

  it('finds the next and the previous one, from a gap too', () => {
    expect(nextChapter(all, 0)).toBe(b);
    expect(nextChapter(all, 25_000)).toBe(c);
    expect(nextChapter(all, 30_000)).toBeUndefined();
    expect(previousChapter(all, 35_000)).toBe(b);
    expect(previousChapter(all, 25_000)).toBe(b);
    expect(previousChapter(all, 5000)).toBeUndefined();
  });

  it('keeps asides from members', () => {
    expect(visibleToMembers(all)).toEqual([c, a]);
    expect(isInAside(all, 15_000)).toBe(true);
    expect(isInAside(all, 20_000)).toBe(false);
  });

  it('shows a cue a moment early and for some seconds', () => {
    const cues = [{ atMs: 8000 }, { atMs: 3000 }];
    expect(cuesAround(cues, 7600)).toEqual([{ atMs: 3000 }, { atMs: 8000 }]);
    expect(cuesAround(cues, 2499)).toEqual([]);
    expect(cuesAround(cues, 9000)).toEqual([{ atMs: 8000 }]);
  });
});

describe('two versions of chapters', () => {
  it('shows by id what each changed, and a conflict only where both did and differ', () => {
    const base = [chapter(0, 5000), chapter(5000, 9000), chapter(10_000, 20_000)] as const;
    const [a, b, c] = base;
    const mine = [{ ...a, title: 'Mine' }, { ...b, note: 'x' }, c];
    const theirs = [{ ...a, title: 'Theirs' }, c, chapter(30_000, 40_000)];
    const rows = compareChapterVersions(base, mine, theirs);
    expect(rows.map(({ myChange, theirChange, conflict }) => [myChange, theirChange, conflict])).toEqual([
      ['changed', 'changed', true],
      ['changed', 'removed', true],
      ['same', 'added', false],
    ]);
    expect(rows[0]).toMatchObject({ id: a.id, myFields: ['title'], theirFields: ['title'] });
  });

  it('finds no conflict when both did the same or only one did something', () => {
    fc.assert(
      fc.property(someChapters, someChapters, (base, other) => {
        expect(compareChapterVersions(base, base, base)).toEqual([]);
        expect(compareChapterVersions(base, other, other).some(({ conflict }) => conflict)).toBe(false);
        expect(compareChapterVersions(base, base, other).some(({ conflict }) => conflict)).toBe(false);
      }),
    );
  });
});
