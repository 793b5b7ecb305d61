import type { KitNeed, OwnedKit } from './kit';

type Item = { name: string; withoutText: string };

/**
 * What somebody lacks for a need, in words: how the item's absence is said, or what of it is too little: "only 1 dumbbell of 2",
 * "no kettlebell of 16 kg". Of several options the one that they are closest to.
 * @param items by id
 */
export function missingText(need: KitNeed, owned: readonly OwnedKit[], items: ReadonlyMap<string, Item>): string {
  const have = (kitItemId: string) => owned.find((kit) => kit.kitItemId === kitItemId);
  const option = need.anyOf.find(({ kitItemId }) => have(kitItemId)) ?? need.anyOf[0];
  const item = option && items.get(option.kitItemId);
  if (!option || !item) return 'missing kit';
  const kit = have(option.kitItemId);
  if (!kit) return item.withoutText;
  if (kit.count < option.count) return `only ${kit.count} ${item.name} of ${option.count}`;
  // enough by itself, but another need of the movement takes it
  return option.minLoadKg === null ? `only ${kit.count} ${item.name}` : `no ${item.name} of ${option.minLoadKg} kg`;
}

/** Several of them as one phrase: "no rope and nothing to hang from". */
export function missingTexts(
  needs: readonly KitNeed[],
  owned: readonly OwnedKit[],
  items: ReadonlyMap<string, Item>,
): string[] {
  return [...new Set(needs.map((need) => missingText(need, owned, items)))];
}
