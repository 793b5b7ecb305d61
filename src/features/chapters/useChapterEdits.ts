import { useState } from 'react';
import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { chapterAt } from '../../../shared/domain/chapters/chapterAt';
import {
  type ChapterEdge,
  type ChapterEdit,
  type ChapterFields,
  endChapterAt,
  joinWithNextChapter,
  moveEdge,
  nudgeEdge,
  removeChapter,
  setFields,
  splitChapterAt,
  startChapterAt,
} from '../../../shared/domain/chapters/editChapters';
import { formatMsWithTenths } from '../../../shared/domain/timecode';
import { announce } from '../../lib/announce';
import type { KeptDocument } from '../../lib/keptDocument';
import { leaveField } from '../../lib/leaveField';
import type { Playhead } from '../../lib/playhead';
import { kindNames, type Names, withOwnName } from './chapterNames';

export type ChapterEdits = ReturnType<typeof useChapterEdits>;

type Chapters = KeptDocument<readonly Chapter[]>;

/**
 * The edits of the marking page over the rules, with the chapter that they are about.
 * @param durationMs ms; without it nothing can be placed
 */
export function useChapterEdits(kept: Chapters, playhead: Playhead, durationMs: number, movements: Names) {
  const [selectedId, setSelectedId] = useState<string | null>(null);
  const [refused, setRefused] = useState<string | null>(null);
  const chapters = () => kept.current().content;

  const apply = (edit: ChapterEdit, said: string | null, group?: string): string | null => {
    if ('refused' in edit) {
      setRefused(edit.refused);
      announce(edit.refused);
      return edit.refused;
    }
    kept.change(edit.chapters, group);
    setRefused(null);
    setSelectedId(edit.selectedId);
    if (said) announce(said);
    return null;
  };
  const atMs = () => Math.round(playhead.atMs());
  const at = () => formatMsWithTenths(atMs());
  const select = (id: string | null, seek: 'seek' | 'stay') => {
    setSelectedId(id);
    setRefused(null);
    const chapter = chapters().find((one) => one.id === id);
    if (chapter && seek === 'seek') playhead.seekTo(chapter.startMs);
  };
  /** one chapter on or back; from nowhere, the one that plays */
  const step = (by: 1 | -1) => {
    const list = chapters();
    const place = list.findIndex(({ id }) => id === selectedId);
    const next = place < 0 ? (chapterAt(list, atMs()) ?? list[0]) : list[place + by];
    if (next) select(next.id, 'seek');
  };
  /** @param made a movement that was added a moment ago, and is not among the names yet */
  const set = (id: string, change: Partial<ChapterFields>, made?: { id: string; name: string }): string | null => {
    const chapter = chapters().find((one) => one.id === id);
    if (!chapter) return null;
    const names = made ? new Map(movements).set(made.id, made.name) : movements;
    const edit = setFields(chapters(), id, withOwnName(chapter, change, names));
    if ('refused' in edit) return edit.refused;
    kept.change(edit.chapters, `${id} ${Object.keys(change).join()}`);
    return null;
  };

  return {
    selectedId,
    refused,
    select,
    selectBefore: () => step(-1),
    selectAfter: () => step(1),
    /** out of a field first, then out of the chapter */
    close: () => {
      if (!leaveField()) select(null, 'stay');
    },
    startHere: () =>
      apply(
        startChapterAt(
          chapters(),
          atMs(),
          { id: crypto.randomUUID(), kind: 'demo', title: kindNames.demo },
          durationMs,
        ),
        `Chapter starts at ${at()}`,
      ),
    endHere: () => apply(endChapterAt(chapters(), atMs(), durationMs), `Chapter ends at ${at()}`),
    splitHere: () => apply(splitChapterAt(chapters(), atMs(), crypto.randomUUID()), `Split at ${at()}`),
    join: () => selectedId && apply(joinWithNextChapter(chapters(), selectedId), 'Joined with the next'),
    remove: () => selectedId && apply(removeChapter(chapters(), selectedId), 'Removed. Undo brings it back'),
    nudge: (edge: ChapterEdge, byMs: number) => {
      const chapter = chapters().find(({ id }) => id === selectedId);
      if (!chapter) return;
      apply(nudgeEdge(chapters(), chapter.id, edge, byMs, durationMs), null, `${chapter.id} ${edge}`);
      const moved = chapters().find(({ id }) => id === chapter.id);
      // the picture shows what the edge cuts at
      if (moved) playhead.seekTo(edge === 'start' ? moved.startMs : moved.endMs);
    },
    move: (id: string, edge: ChapterEdge, toMs: number) =>
      apply(moveEdge(chapters(), id, edge, toMs, durationMs), null),
    set,
    setSelected: (change: Partial<ChapterFields>) => {
      if (selectedId === null) return;
      const reason = set(selectedId, change);
      if (reason) announce(reason);
    },
    undo: () => {
      kept.undo();
      announce('Undone');
    },
    redo: () => {
      kept.redo();
      announce('Done again');
    },
  };
}
