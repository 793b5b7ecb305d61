import { parseTime } from '../../../shared/domain/timecode';

type Recording = {
  durationMs: number;
  placeMs: number | null;
  chapters: readonly { id: string; startMs: number }[];
};

export type Start = { atMs: number; because: 'time' | 'chapter' | 'place' | 'beginning' };

/** Who stopped this close to the end has seen it, and this close to the beginning has not begun. */
const nearMs = 5000;

/**
 * Where a recording starts: at the time in the address (`?t=271.2` in seconds, as media fragments count them, or `?t=4:31`),
 * at the chapter in it (`?c=`), else where the person stopped, else at the beginning.
 * Source of the form in seconds: W3C Media Fragments URI 1.0, 4.2.1, normal play time.
 */
export function whereToStart(search: URLSearchParams, { durationMs, placeMs, chapters }: Recording): Start {
  const atMs = parseTime(search.get('t')?.replace(/^npt:/, '') ?? '');
  if (atMs !== null) return { atMs: Math.min(atMs, durationMs), because: 'time' };
  const chapter = chapters.find(({ id }) => id === search.get('c'));
  if (chapter) return { atMs: chapter.startMs, because: 'chapter' };
  if (placeMs !== null && placeMs >= nearMs && placeMs <= durationMs - nearMs)
    return { atMs: placeMs, because: 'place' };
  return { atMs: 0, because: 'beginning' };
}
