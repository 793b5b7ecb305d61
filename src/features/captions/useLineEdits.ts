import { useCallback, useRef, useState } from 'react';
import {
  deleteLine,
  insertLine,
  joinWithNext,
  type LineEdit,
  moveTimes,
  setText,
  splitLine,
} from '../../../shared/domain/captions/editLines';
import { announce } from '../../lib/announce';
import type { KeptDocument } from '../../lib/keptDocument';
import { leaveField } from '../../lib/leaveField';
import type { Playhead } from '../../lib/playhead';
import type { Lines } from './api';
import { lineAt } from './lineFaults';

/** Where the cursor goes after an edit moved the line that one writes in. */
export type Caret = { index: number; character: number };

/** A new line lasts this long where there is room, ms. */
const freshMs = 2000;

export type LineEdits = ReturnType<typeof useLineEdits>;

/** The edits of the words page over the rules, with the line that they are about. */
export function useLineEdits(kept: KeptDocument<Lines>, playhead: Playhead, durationMs: number | null) {
  const [at, setAt] = useState<number | null>(null);
  const [refused, setRefused] = useState<string | null>(null);
  const [typed, setTyped] = useState<{ index: number; text: string } | null>(null);
  // drawn again, so that the row takes the cursor
  const [, setMoved] = useState(0);
  const caret = useRef<Caret | null>(null);
  const lines = kept.current;

  const apply = (edit: LineEdit, said: string | null, group?: string): boolean => {
    if ('refused' in edit) {
      setRefused(edit.refused);
      announce(edit.refused);
      return false;
    }
    kept.change(edit.lines, group);
    setRefused(null);
    setTyped(null);
    setAt(edit.lines.length === 0 ? null : edit.index);
    if (said) announce(said);
    return true;
  };
  const select = useCallback(
    (index: number, seek: 'seek' | 'stay') => {
      setAt(index);
      setRefused(null);
      const line = lines().content[index];
      if (line && seek === 'seek') playhead.seekTo(line.startMs);
    },
    [lines, playhead],
  );

  const move = (index: number, times: { startMs?: number; endMs?: number }) => {
    const line = lines().content[index];
    // a start that is moved behind the end takes the line along
    const whole =
      line && times.startMs !== undefined && times.startMs >= line.endMs
        ? { startMs: times.startMs, endMs: times.startMs + line.endMs - line.startMs }
        : times;
    apply(moveTimes(lines().content, index, whole), null, `times ${index}`);
  };

  return {
    at,
    refused,
    /** what stands in a field and is no fit line yet */
    typed,
    caret,
    select,
    play: (index: number) => {
      select(index, 'seek');
      playhead.play();
    },
    /** out of a field first, then out of the line */
    close: () => {
      if (!leaveField()) setAt(null);
    },
    step: (by: 1 | -1) => {
      const { content } = lines();
      const from = at ?? Math.max(0, lineAt(content, playhead.atMs()) - by);
      const to = Math.max(0, Math.min(from + by, content.length - 1));
      if (content[to]) select(to, 'seek');
    },
    write: (index: number, text: string) => {
      const edit = setText(lines().content, index, text);
      if ('refused' in edit) setRefused(edit.refused);
      else {
        kept.change(edit.lines, `text ${index}`);
        setRefused(null);
      }
      setTyped({ index, text });
    },
    /** out of a field: a line that was emptied keeps its words */
    leave: () => {
      if (typed?.text.trim() === '') announce('The line keeps its words. Delete it to take it away.');
      if (typed) setRefused(null);
      setTyped(null);
    },
    split: (index: number, character: number, how: 'by share' | 'at the picture') => {
      const at = { character, ...(how === 'at the picture' ? { timeMs: Math.round(playhead.atMs()) } : {}) };
      if (apply(splitLine(lines().content, index, at), 'Line split'))
        caret.current = { index: index + 1, character: 0 };
    },
    join: (index: number) => {
      const end = lines().content[index]?.text.length ?? 0;
      if (apply(joinWithNext(lines().content, index), 'Lines joined')) caret.current = { index, character: end };
    },
    remove: (index: number) => apply(deleteLine(lines().content, index), 'Line deleted. Undo brings it back'),
    /** after a line, or at the picture's place in an empty list or a gap */
    insert: (after: number | null) => {
      const { content } = lines();
      const startMs = Math.round((after === null ? undefined : content[after]?.endMs) ?? playhead.atMs());
      const next = content.find((line) => line.startMs > startMs)?.startMs ?? durationMs ?? startMs + freshMs;
      const endMs = Math.max(startMs + 100, Math.min(startMs + freshMs, next));
      const edit = insertLine(content, { startMs, endMs, text: 'New line' });
      if (apply(edit, 'Line added') && 'index' in edit) caret.current = { index: edit.index, character: -1 };
    },
    move,
    startHere: () => at !== null && move(at, { startMs: Math.round(playhead.atMs()) }),
    endHere: () => at !== null && move(at, { endMs: Math.round(playhead.atMs()) }),
    writeIn: (index: number) => {
      caret.current = { index, character: lines().content[index]?.text.length ?? 0 };
      setAt(index);
      setMoved((count) => count + 1);
    },
    undo: () => {
      kept.undo();
      setTyped(null);
      announce('Undone');
    },
    redo: () => {
      kept.redo();
      setTyped(null);
      announce('Done again');
    },
  };
}
