/** Undo as a value: what was, what is, what was undone. One for any document that is edited by pure functions. */
export type History<T> = {
  readonly past: readonly T[];
  readonly present: T;
  readonly future: readonly T[];
};

/** An afternoon's marking of one recording; older steps are forgotten first. */
const stepsKept = 200;

export function startHistory<T>(present: T): History<T> {
  return { past: [], present, future: [] };
}

/** Takes a step. What had been undone is gone; a step that changes nothing is none. */
export function takeStep<T>(history: History<T>, next: T): History<T> {
  if (Object.is(next, history.present)) return history;
  return { past: [...history.past, history.present].slice(-stepsKept), present: next, future: [] };
}

/** One step back; the same history when there is none. */
export function undo<T>(history: History<T>): History<T> {
  const [stepped] = history.past.slice(-1).map((present) => ({
    past: history.past.slice(0, -1),
    present,
    future: [history.present, ...history.future],
  }));
  return stepped ?? history;
}

/** One undone step forward again; the same history when there is none. */
export function redo<T>(history: History<T>): History<T> {
  const [stepped] = history.future.slice(0, 1).map((present) => ({
    past: [...history.past, history.present],
    present,
    future: history.future.slice(1),
  }));
  return stepped ?? history;
}

export const canUndo = (history: History<unknown>) => history.past.length > 0;
export const canRedo = (history: History<unknown>) => history.future.length > 0;
