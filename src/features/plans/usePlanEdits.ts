import { useMemo } from 'react';
import { flushSync } from 'react-dom';
import type { BlockKind } from '../../../shared/domain/words';
import { limits } from '../../../shared/limits';
import { announce } from '../../lib/announce';
import type { KeptDocument } from '../../lib/keptDocument';
import * as edit from './editPlan';
import { isBlankLine, type WrittenBlock, type WrittenLine, type WrittenPlan } from './writtenPlan';

export type PlanEdits = ReturnType<typeof usePlanEdits>;

/** What can be given the focus after an edit: a part of a block or of a line. */
type Part = 'kind' | 'movement' | 'dose' | 'up' | 'down' | 'add';

/** Gives the focus to the first of these parts that is there and works. */
function focusOn(...parts: [id: string, part: Part][]): void {
  for (const [id, part] of parts) {
    const controls = ':is(input, select, button):enabled';
    const at = `[data-of="${id}"] [data-part="${part}"]`;
    const control = document.querySelector<HTMLElement>(`${at}${controls}, ${at} ${controls}`);
    if (!control) continue;
    control.focus();
    return;
  }
}

/** The edits of the plan's page over the rules; each leaves the focus where the work goes on. */
export function usePlanEdits(kept: KeptDocument<WrittenPlan>) {
  return useMemo(() => {
    const plan = () => kept.current().content;
    // drawn at once, so that what was added can have the focus
    const apply = (next: WrittenPlan, group?: string) => flushSync(() => kept.change(next, group));
    const blockOf = (lineId: string) => plan().blocks.find((block) => block.lines.some(({ id }) => id === lineId));
    const addLineTo = (block: WrittenBlock, afterId: string | null) => {
      if (block.lines.length >= limits.linesPerBlock)
        return announce(`A block has at most ${limits.linesPerBlock} lines.`);
      const line = edit.newLine(crypto.randomUUID());
      apply(edit.addLine(plan(), block.id, line, afterId));
      focusOn([line.id, 'movement']);
    };
    return {
      setHead: (change: Partial<Omit<WrittenPlan, 'blocks'>>) =>
        kept.change({ ...plan(), ...change }, `head ${Object.keys(change).join()}`),
      addBlock: (kind: BlockKind) => {
        const block = edit.newBlock(crypto.randomUUID(), kind);
        apply(edit.addBlock(plan(), block));
        focusOn([block.id, 'kind']);
      },
      setBlock: (id: string, change: Partial<WrittenBlock>) =>
        kept.change(edit.setBlock(plan(), id, change), `${id} ${Object.keys(change).join()}`),
      removeBlock: (id: string) => {
        const { blocks } = plan();
        const at = blocks.findIndex((block) => block.id === id);
        apply(edit.removeBlock(plan(), id));
        announce('Block removed. Undo brings it back');
        const next = blocks[at + 1] ?? blocks[at - 1];
        focusOn([next?.id ?? 'plan', next ? 'kind' : 'add']);
      },
      moveBlock: (id: string, by: 1 | -1) => {
        apply(edit.moveBlock(plan(), id, by));
        const { blocks } = plan();
        announce(`Block ${blocks.findIndex((block) => block.id === id) + 1} of ${blocks.length}`);
        focusOn([id, by === 1 ? 'down' : 'up'], [id, by === 1 ? 'up' : 'down']);
      },
      addLine: (blockId: string) => {
        const block = plan().blocks.find(({ id }) => id === blockId);
        const last = block?.lines.at(-1);
        if (last && isBlankLine(last)) return focusOn([last.id, 'movement']);
        if (block) addLineTo(block, null);
      },
      /** the line behind this one: a blank one that is there already, else a new one */
      nextLine: (id: string) => {
        const block = blockOf(id);
        const at = block?.lines.findIndex((line) => line.id === id) ?? -1;
        const [line, next] = block?.lines.slice(at, at + 2) ?? [];
        if (!block || !line || isBlankLine(line)) return;
        if (next && isBlankLine(next)) focusOn([next.id, 'movement']);
        else addLineTo(block, id);
      },
      setLine: (id: string, change: Partial<WrittenLine>) =>
        kept.change(edit.setLine(plan(), id, change), `${id} ${Object.keys(change).join()}`),
      chooseMovement: (id: string, movementId: string | null) => {
        // on leaving the field the focus is on its way elsewhere already
        const isInField = document.activeElement?.closest(`[data-of="${id}"] [data-part="movement"]`) != null;
        apply(edit.setLine(plan(), id, { movementId }));
        const line = blockOf(id)?.lines.find((one) => one.id === id);
        if (isInField && movementId !== null && !line?.dose) focusOn([id, 'dose']);
      },
      removeLine: (id: string) => {
        const block = blockOf(id);
        const at = block?.lines.findIndex((line) => line.id === id) ?? -1;
        apply(edit.removeLine(plan(), id));
        announce('Line removed. Undo brings it back');
        const next = block?.lines[at + 1] ?? block?.lines[at - 1];
        if (next) focusOn([next.id, 'movement']);
        else if (block) focusOn([block.id, 'add']);
      },
      moveLine: (id: string, by: 1 | -1) => {
        const from = blockOf(id)?.id;
        apply(edit.moveLine(plan(), id, by));
        const block = blockOf(id);
        const at = (block?.lines.findIndex((line) => line.id === id) ?? 0) + 1;
        announce(`Line ${at} of ${block?.lines.length}${block?.id === from ? '' : ', in the block beside'}`);
        focusOn([id, by === 1 ? 'down' : 'up'], [id, by === 1 ? 'up' : 'down']);
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
  }, [kept]);
}
