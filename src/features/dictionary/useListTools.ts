import { useLayoutEffect, useRef, useState } from 'react';
import { announce } from '../../lib/announce';

type Rows<Row> = {
  fields: readonly { id: string }[];
  move: (from: number, to: number) => void;
  remove: (at: number) => void;
  insert: (at: number, row: Row) => void;
};

export type ListTools = {
  box: React.RefObject<HTMLDivElement | null>;
  count: number;
  move: (at: number, step: 1 | -1) => void;
  remove: (at: number) => void;
  /** what was taken out last, and the way back */
  taken: { text: string; putBack: () => void } | null;
};

/**
 * Moving and removing lines with buttons: the focus goes along with the line, and the last one that was taken out can be put back.
 * @param rowAt the line as it is now
 * @param textOf how it is called in “… was taken out”
 */
export function useListTools<Row>(
  rows: Rows<Row>,
  rowAt: (at: number) => Row,
  textOf: (row: Row) => string,
): ListTools {
  const box = useRef<HTMLDivElement>(null);
  const [taken, setTaken] = useState<{ at: number; row: Row } | null>(null);
  const next = useRef<(() => HTMLElement | null | undefined) | null>(null);
  useLayoutEffect(() => {
    next.current?.()?.focus();
    next.current = null;
  });
  const within = (at: number) => box.current?.querySelector(`[data-line="${at}"]`);
  const pressable = (at: number, what: string) =>
    within(at)?.querySelector<HTMLElement>(`button[data-does="${what}"]:not(:disabled)`);

  return {
    box,
    count: rows.fields.length,
    move: (at, step) => {
      rows.move(at, at + step);
      const [same, other] = step === 1 ? ['down', 'up'] : ['up', 'down'];
      next.current = () => pressable(at + step, same ?? '') ?? pressable(at + step, other ?? '');
      announce(`Now ${at + step + 1} of ${rows.fields.length}`);
    },
    remove: (at) => {
      const row = rowAt(at);
      setTaken(textOf(row).trim() === '' ? null : { at, row });
      rows.remove(at);
      next.current = () => {
        const line = within(at) ?? within(at - 1);
        return (
          line?.querySelector<HTMLElement>('button[data-does="remove"]') ??
          box.current?.querySelector<HTMLElement>('button[data-does="add"]')
        );
      };
    },
    taken: taken && {
      text: textOf(taken.row),
      putBack: () => {
        rows.insert(Math.min(taken.at, rows.fields.length), taken.row);
        setTaken(null);
      },
    },
  };
}
