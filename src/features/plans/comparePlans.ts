import type { Difference } from '../../lib/mergeVersions';
import type { WrittenBlock, WrittenPlan } from './writtenPlan';

const heads = ['date', 'title', 'aim', 'note'] as const;
export type PlanHead = (typeof heads)[number];

/** What two versions of a plan are compared by: what stands at its head, and each block as a whole. */
export type PlanEntry =
  | { is: 'head'; id: PlanHead; text: string }
  | { is: 'block'; id: string; block: WrittenBlock }
  | { is: 'order'; id: 'order'; ids: string[] };

export function entriesOf(plan: WrittenPlan): PlanEntry[] {
  return [
    ...heads.map((id): PlanEntry => ({ is: 'head', id, text: plan[id] })),
    ...plan.blocks.map((block): PlanEntry => ({ is: 'block', id: block.id, block })),
    { is: 'order', id: 'order', ids: plan.blocks.map(({ id }) => id) },
  ];
}

/**
 * What differs between two people's versions, in the order of the plan. An order differs only where blocks that all versions have
 * changed places: one more block is no other order.
 * @param theirs the entries of their version, the very ones that the answer points at
 */
export function comparePlans(
  base: WrittenPlan,
  mine: WrittenPlan,
  theirs: readonly PlanEntry[],
): Difference<PlanEntry>[] {
  const [was, my] = [entriesOf(base), entriesOf(mine)];
  const ids = [...new Set([...theirs, ...my, ...was].map(({ id }) => id))];
  const versions = [was, my, theirs];
  const everywhere = new Set(ids.filter((id) => versions.every((entries) => entries.some((entry) => entry.id === id))));
  const find = (entries: readonly PlanEntry[], id: string) => entries.find((entry) => entry.id === id) ?? null;
  const text = (entry: PlanEntry | null) =>
    JSON.stringify(entry?.is === 'order' ? entry.ids.filter((id) => everywhere.has(id)) : entry);
  const change = (from: PlanEntry | null, to: PlanEntry | null): Difference<PlanEntry>['myChange'] => {
    if (text(from) === text(to)) return 'same';
    return !from ? 'added' : !to ? 'removed' : 'changed';
  };
  return ids
    .map((id): Difference<PlanEntry> => {
      const [b, m, t] = [find(was, id), find(my, id), find(theirs, id)];
      const [myChange, theirChange] = [change(b, m), change(b, t)];
      const conflict = myChange !== 'same' && theirChange !== 'same' && text(m) !== text(t);
      return { base: b, mine: m, theirs: t, myChange, theirChange, conflict };
    })
    .filter(({ myChange, theirChange }) => myChange !== 'same' || theirChange !== 'same');
}

/**
 * A plan from the entries of two versions. A block that the order does not know stands behind the one that it followed in `mine`.
 * @param chosen the entries that were taken, each once
 */
export function joinEntries(chosen: readonly PlanEntry[], mine: WrittenPlan): WrittenPlan {
  const head = (id: PlanHead) => {
    const entry = chosen.find((one) => one.id === id);
    return entry?.is === 'head' ? entry.text : mine[id];
  };
  const blocks = chosen.flatMap((entry) => (entry.is === 'block' ? [entry.block] : []));
  const order = chosen.flatMap((entry) => (entry.is === 'order' ? entry.ids : []));
  const myOrder = mine.blocks.map(({ id }) => id);
  for (const { id } of blocks) {
    if (order.includes(id)) continue;
    const at = myOrder.indexOf(id);
    const before = myOrder.slice(0, at < 0 ? undefined : at).findLast((one) => order.includes(one));
    order.splice(before === undefined ? 0 : order.indexOf(before) + 1, 0, id);
  }
  return {
    date: head('date'),
    title: head('title'),
    aim: head('aim'),
    note: head('note'),
    blocks: linesOnce(blocks.toSorted((a, b) => order.indexOf(a.id) - order.indexOf(b.id))),
  };
}

/** A line that one of the two moved to another block would be there twice. */
function linesOnce(blocks: readonly WrittenBlock[]): WrittenBlock[] {
  const seen = new Set<string>();
  return blocks.map((block) => ({
    ...block,
    lines: block.lines.filter(({ id }) => !seen.has(id) && seen.add(id)),
  }));
}
