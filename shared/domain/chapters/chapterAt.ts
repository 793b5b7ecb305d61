import type { ChapterKind } from '../words';
import { sortChapters } from './chapterRules';

type Span = { startMs: number; endMs: number };

/** The chapter that plays at a time; its end belongs to what follows. */
export function chapterAt<C extends Span>(chapters: readonly C[], atMs: number): C | undefined {
  return chapters.find(({ startMs, endMs }) => startMs <= atMs && atMs < endMs);
}

/** The first chapter that starts after a time. */
export function nextChapter<C extends Span>(chapters: readonly C[], atMs: number): C | undefined {
  return sortChapters(chapters).find(({ startMs }) => startMs > atMs);
}

/** The chapter before the one that plays; in a gap, the one that ended last. */
export function previousChapter<C extends Span>(chapters: readonly C[], atMs: number): C | undefined {
  const from = chapterAt(chapters, atMs)?.startMs ?? atMs;
  return sortChapters(chapters).findLast(({ startMs }) => startMs < from);
}

/** What members may see and find: everything but asides. */
export function visibleToMembers<C extends { kind: ChapterKind }>(chapters: readonly C[]): C[] {
  return chapters.filter(({ kind }) => kind !== 'aside');
}

/** Whether a time lies in an aside: what is said and cued there is kept from members too. */
export function isInAside(chapters: readonly (Span & { kind: ChapterKind })[], atMs: number): boolean {
  return chapters.some(({ kind, startMs, endMs }) => kind === 'aside' && startMs <= atMs && atMs < endMs);
}

/** A cue is shown a moment before what it is about, and long enough to be read while moving (common practice, no source). */
export const cueShown = { beforeMs: 500, afterMs: 6000 } as const;

/** The cues to show beside the picture at a time, in order. */
export function cuesAround<C extends { atMs: number }>(cues: readonly C[], ms: number): C[] {
  return cues
    .filter(({ atMs }) => atMs - cueShown.beforeMs <= ms && ms < atMs + cueShown.afterMs)
    .toSorted((a, b) => a.atMs - b.atMs);
}
