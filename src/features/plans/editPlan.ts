import type { BlockKind } from '../../../shared/domain/words';
import type { WrittenBlock, WrittenLine, WrittenPlan, WrittenSubstitution } from './writtenPlan';

/** The edits of a plan as pure functions; an edit that changes nothing gives the same plan. */

export const newBlock = (id: string, kind: BlockKind): WrittenBlock => ({
  id,
  kind,
  title: '',
  scheme: '',
  note: '',
  lines: [],
});

export const newLine = (id: string): WrittenLine => ({ id, movementId: null, dose: '', note: '', substitutions: [] });

export const newSubstitution = (
  id: string,
  lacking: Pick<WrittenSubstitution, 'missing' | 'missingKitItemId'>,
): WrittenSubstitution => ({ id, movementId: null, dose: '', reason: '', ...lacking });

export const addBlock = (plan: WrittenPlan, block: WrittenBlock): WrittenPlan => ({
  ...plan,
  blocks: [...plan.blocks, block],
});

export const setBlock = (plan: WrittenPlan, id: string, change: Partial<WrittenBlock>): WrittenPlan => ({
  ...plan,
  blocks: plan.blocks.map((block) => (block.id === id ? { ...block, ...change } : block)),
});

export const removeBlock = (plan: WrittenPlan, id: string): WrittenPlan => ({
  ...plan,
  blocks: plan.blocks.filter((block) => block.id !== id),
});

/** One place up or down. */
export function moveBlock(plan: WrittenPlan, id: string, by: 1 | -1): WrittenPlan {
  const blocks = moved(plan.blocks, id, by);
  return blocks === plan.blocks ? plan : { ...plan, blocks: [...blocks] };
}

/** Puts a line behind another, or at the end of the block. */
export function addLine(plan: WrittenPlan, blockId: string, line: WrittenLine, afterId: string | null): WrittenPlan {
  const block = plan.blocks.find(({ id }) => id === blockId);
  if (!block) return plan;
  const at = afterId === null ? -1 : block.lines.findIndex(({ id }) => id === afterId);
  return setBlock(plan, blockId, { lines: block.lines.toSpliced(at < 0 ? block.lines.length : at + 1, 0, line) });
}

export const setLine = (plan: WrittenPlan, id: string, change: Partial<WrittenLine>): WrittenPlan => ({
  ...plan,
  blocks: plan.blocks.map((block) =>
    block.lines.some((line) => line.id === id)
      ? { ...block, lines: block.lines.map((line) => (line.id === id ? { ...line, ...change } : line)) }
      : block,
  ),
});

export const removeLine = (plan: WrittenPlan, id: string): WrittenPlan => ({
  ...plan,
  blocks: plan.blocks.map((block) =>
    block.lines.some((line) => line.id === id)
      ? { ...block, lines: block.lines.filter((line) => line.id !== id) }
      : block,
  ),
});

/** One place up or down; from a block's edge into the block beside it. */
export function moveLine(plan: WrittenPlan, id: string, by: 1 | -1): WrittenPlan {
  const at = plan.blocks.findIndex((block) => block.lines.some((line) => line.id === id));
  const block = plan.blocks[at];
  const line = block?.lines.find((one) => one.id === id);
  if (!block || !line) return plan;
  const lines = moved(block.lines, id, by);
  if (lines !== block.lines) return setBlock(plan, block.id, { lines: [...lines] });
  const beside = plan.blocks[at + by];
  if (!beside) return plan;
  return setBlock(removeLine(plan, id), beside.id, {
    lines: by === 1 ? [line, ...beside.lines] : [...beside.lines, line],
  });
}

function moved<T extends { id: string }>(items: readonly T[], id: string, by: 1 | -1): readonly T[] {
  const at = items.findIndex((item) => item.id === id);
  const item = items[at];
  if (!item || at + by < 0 || at + by >= items.length) return items;
  return items.toSpliced(at, 1).toSpliced(at + by, 0, item);
}
