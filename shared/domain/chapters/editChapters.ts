import { Chapter } from './chapter';
import { sortChapters } from './chapterRules';

/** What an edit leaves: the new chapters in order and the one to go on with, or a sentence that says why not. */
export type ChapterEdit = { chapters: Chapter[]; selectedId: string | null } | { refused: string };

export type ChapterEdge = 'start' | 'end';

/** What can be said about a chapter; its times move by their own edits. */
export type ChapterFields = Omit<Chapter, 'id' | 'startMs' | 'endMs'>;

/** No edit makes a chapter shorter than one small nudge; its edges could not be told apart any more. */
export const shortestByEditMs = 100;

/** The steps of the nudge buttons. */
export const nudgeSteps = [-1000, -100, 100, 1000] as const;

const noSuchChapter: ChapterEdit = { refused: 'This chapter is not there any more.' };

function edited(chapters: readonly Chapter[], selectedId: string | null): ChapterEdit {
  return { chapters: sortChapters(chapters), selectedId };
}

const misfit = (error: { issues: { message: string }[] }): ChapterEdit => ({
  refused: error.issues[0]?.message ?? 'This does not fit.',
});

const swap = (chapters: readonly Chapter[], fresh: Chapter) =>
  chapters.map((chapter) => (chapter.id === fresh.id ? fresh : chapter));

const clamp = (value: number, least: number, most: number) => Math.max(least, Math.min(value, most));

/**
 * Starts a chapter at the playhead. The chapter that plays there ends there, and the new one takes over up to its old end;
 * in a gap the new one goes on to the next chapter or to the end of the recording.
 */
export function startChapterAt(
  chapters: readonly Chapter[],
  playheadMs: number,
  fresh: { id: string; kind: Chapter['kind']; title: string },
  durationMs: number,
): ChapterEdit {
  const atMs = Math.round(playheadMs);
  const current = chapters.find((chapter) => chapter.startMs <= atMs && atMs < chapter.endMs);
  const next = sortChapters(chapters).find((chapter) => chapter.startMs > atMs);
  const endMs = current?.endMs ?? Math.min(next?.startMs ?? durationMs, durationMs);
  if (current && atMs - current.startMs < shortestByEditMs) return { refused: 'A chapter starts here already.' };
  if (endMs - atMs < shortestByEditMs) return { refused: 'There is no room for a chapter here.' };
  const parsed = Chapter.safeParse({ ...fresh, startMs: atMs, endMs });
  if (!parsed.success) return misfit(parsed.error);
  const chapter = parsed.data;
  const others = current ? swap(chapters, { ...current, endMs: atMs }) : chapters;
  return edited([...others, chapter], chapter.id);
}

/** Ends the chapter that plays at the playhead there; in a gap, lets the chapter before it go on to the playhead. */
export function endChapterAt(chapters: readonly Chapter[], atMs: number, durationMs: number): ChapterEdit {
  const chapter = sortChapters(chapters).findLast(({ startMs }) => startMs < atMs);
  if (!chapter) return { refused: 'No chapter has started yet.' };
  return moveEdge(chapters, chapter.id, 'end', atMs, durationMs);
}

/** Moves one edge of a chapter to a time, as far as its neighbours, its other edge and the recording allow. */
export function moveEdge(
  chapters: readonly Chapter[],
  id: string,
  edge: ChapterEdge,
  toMs: number,
  durationMs: number,
): ChapterEdit {
  const ordered = sortChapters(chapters);
  const place = ordered.findIndex((chapter) => chapter.id === id);
  const chapter = ordered[place];
  if (!chapter) return noSuchChapter;
  const { startMs, endMs } = chapter;
  const moved =
    edge === 'start'
      ? {
          ...chapter,
          startMs: clamp(Math.round(toMs), ordered[place - 1]?.endMs ?? 0, Math.max(startMs, endMs - shortestByEditMs)),
        }
      : {
          ...chapter,
          endMs: clamp(
            Math.round(toMs),
            Math.min(endMs, startMs + shortestByEditMs),
            Math.min(ordered[place + 1]?.startMs ?? durationMs, durationMs),
          ),
        };
  return edited(swap(ordered, moved), id);
}

/** Moves an edge by a step, `nudgeSteps` in milliseconds. */
export function nudgeEdge(
  chapters: readonly Chapter[],
  id: string,
  edge: ChapterEdge,
  byMs: number,
  durationMs: number,
): ChapterEdit {
  const chapter = chapters.find((one) => one.id === id);
  if (!chapter) return noSuchChapter;
  const from = edge === 'start' ? chapter.startMs : chapter.endMs;
  return moveEdge(chapters, id, edge, from + byMs, durationMs);
}

/** Cuts the chapter at the playhead in two that say the same; the second gets `newId`. */
export function splitChapterAt(chapters: readonly Chapter[], playheadMs: number, newId: string): ChapterEdit {
  const atMs = Math.round(playheadMs);
  const chapter = chapters.find(({ startMs, endMs }) => startMs < atMs && atMs < endMs);
  if (!chapter) return { refused: 'No chapter plays here.' };
  if (atMs - chapter.startMs < shortestByEditMs || chapter.endMs - atMs < shortestByEditMs)
    return { refused: 'This is too close to the edge of the chapter to split it.' };
  return edited([...swap(chapters, { ...chapter, endMs: atMs }), { ...chapter, id: newId, startMs: atMs }], newId);
}

/** Makes one chapter of this and the next; what this one says stays, a gap between them is taken in. */
export function joinWithNextChapter(chapters: readonly Chapter[], id: string): ChapterEdit {
  const ordered = sortChapters(chapters);
  const place = ordered.findIndex((chapter) => chapter.id === id);
  const chapter = ordered[place];
  const next = ordered[place + 1];
  if (!chapter) return noSuchChapter;
  if (!next) return { refused: 'There is no chapter after this one.' };
  const note = [chapter.note, next.note].filter((text) => text !== '').join('\n');
  const joined = { ...chapter, endMs: next.endMs, note: chapter.note === next.note ? chapter.note : note };
  if (!Chapter.shape.note.safeParse(joined.note).success)
    return { refused: 'The two notes together are too long. Shorten one of them first.' };
  return edited(
    swap(
      ordered.filter((other) => other.id !== next.id),
      joined,
    ),
    id,
  );
}

/** Takes a chapter away and leaves a gap. */
export function removeChapter(chapters: readonly Chapter[], id: string): ChapterEdit {
  const ordered = sortChapters(chapters);
  const place = ordered.findIndex((chapter) => chapter.id === id);
  if (place < 0) return noSuchChapter;
  return edited(
    ordered.filter((chapter) => chapter.id !== id),
    (ordered[place + 1] ?? ordered[place - 1])?.id ?? null,
  );
}

/** Says something else about a chapter. What only a substitution says is dropped from every other kind. */
export function setFields(chapters: readonly Chapter[], id: string, change: Partial<ChapterFields>): ChapterEdit {
  const chapter = chapters.find((one) => one.id === id);
  if (!chapter) return noSuchChapter;
  const parsed = Chapter.safeParse(withoutStrays({ ...chapter, ...change }));
  if (!parsed.success) return misfit(parsed.error);
  return edited(swap(chapters, parsed.data), id);
}

function withoutStrays(chapter: Chapter): Chapter {
  if (chapter.kind !== 'substitution')
    return { ...chapter, standsInForMovementId: null, missing: null, missingKitItemId: null };
  return chapter.missing === 'kit' ? chapter : { ...chapter, missingKitItemId: null };
}
