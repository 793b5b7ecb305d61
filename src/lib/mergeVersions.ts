/** What three-way comparisons of chapters, cues and caption lines have in common. */
export type Difference<Item> = {
  base: Item | null;
  mine: Item | null;
  theirs: Item | null;
  myChange: 'same' | 'added' | 'removed' | 'changed';
  theirChange: 'same' | 'added' | 'removed' | 'changed';
  conflict: boolean;
};

export type Side = 'mine' | 'theirs';

/** Which side's state of an entry goes into the two together: whoever changed it; where both did, what was chosen. */
export const sideOf = (difference: Difference<unknown>, chosen: Side | undefined): Side | undefined =>
  difference.conflict ? chosen : difference.myChange === 'same' ? 'theirs' : 'mine';

/**
 * Both people's changes together: their version, with each difference as the side that it is taken from has it.
 * @param theirs the very list that `differences` was made from: entries are told apart by identity, lines have no ids
 * @param chosen the sides for conflicts, in the order of `differences`; one without a choice stays as they have it
 */
export function mergeVersions<Item>(
  theirs: readonly Item[],
  differences: readonly Difference<Item>[],
  chosen: readonly (Side | undefined)[],
): Item[] {
  const touched = new Set(differences.map((difference) => difference.theirs));
  const picked = differences.flatMap(
    (difference, at) => (sideOf(difference, chosen[at]) === 'mine' ? difference.mine : difference.theirs) ?? [],
  );
  return [...theirs.filter((item) => !touched.has(item)), ...picked];
}
