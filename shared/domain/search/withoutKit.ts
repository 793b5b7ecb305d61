import type { SearchDictionary } from './dictionary';

/** The longest name of a kit item in words. */
const longestName = 4;
/** A typo of a kit item's name must be this close: what is left out must not be guessed. */
const closeEnough = 0.68;

/**
 * Takes "no rope", "without a bar or rings", "w/o rope" out of a query. Words that follow without naming kit stay where they are.
 * @param words comparable words of the query, "without" for "w/o" and "and" for a comma
 * @returns the kit to do without, each once, and the other words in their order
 */
export function takeWithout(
  words: readonly string[],
  dictionary: SearchDictionary,
): { without: string[]; rest: string[] } {
  const without = new Set<string>();
  const rest: string[] = [];
  let at = 0;
  while (at < words.length) {
    const opening = openingAt(words, at);
    let next = at + opening;
    let found = opening > 0 ? kitAt(words, next, dictionary) : undefined;
    if (!found) {
      rest.push(words[at] ?? '');
      at += 1;
      continue;
    }
    while (found) {
      for (const id of found.ids) without.add(id);
      next = found.end;
      found = joinedAt(words, next, dictionary);
    }
    at = next;
  }
  return { without: [...without], rest };
}

const openings = ['without', 'no', 'minus', 'dont have', 'do not have', 'havent got', 'have no', 'lacking'].map(
  (words) => words.split(' '),
);

/** How many words an opening takes at a place; 0 where there is none. */
function openingAt(words: readonly string[], at: number): number {
  const lengths = openings
    .filter((opening) => opening.every((word, i) => words[at + i] === word))
    .map((opening) => opening.length);
  return Math.max(0, ...lengths);
}

/**
 * A further item after "or" or "and". "and" may also begin what is looked for ("no rope and ring row"): there the item must end the
 * list or the query.
 */
function joinedAt(words: readonly string[], at: number, dictionary: SearchDictionary) {
  const joint = words[at] ?? '';
  if (!/^(?:or|nor|and)$/.test(joint)) return undefined;
  const found = kitAt(words, at + 1, dictionary);
  if (joint !== 'and' || !found) return found;
  return /^(?:|or|nor|and)$/.test(words[found.end] ?? '') ? found : undefined;
}

const everything = /^(?:kit|equipment|gear|anything|nothing)$/;

/** The kit that is named from a place on: the closest match, the longer one of two. */
function kitAt(
  words: readonly string[],
  start: number,
  dictionary: SearchDictionary,
): { ids: readonly string[]; end: number } | undefined {
  let from = start;
  while (/^(?:an?|any|my|the|your)$/.test(words[from] ?? '')) from += 1;
  if (everything.test(words[from] ?? '')) return { ids: dictionary.kitIds, end: from + 1 };
  const { byKey, likeKeys, keyOwners, names } = dictionary.kitNames;
  let best: { ids: string[]; end: number; likeness: number } | undefined;
  for (let end = Math.min(words.length, from + longestName); end > from; end--) {
    const key = words.slice(from, end).join('');
    const exact = (byKey.get(key) ?? []).map((name) => names[name]?.id ?? '');
    if (exact.length > 0) return { ids: exact, end };
    const calledSo = end === from + 1 ? dictionary.kitByLastWord.get(key) : undefined;
    if (calledSo) return { ids: [...calledSo], end };
    if (key.length < 3) continue;
    const [nearest] = likeKeys.nearest(key);
    const enough = key.length < 5 ? closeEnough + 0.05 : closeEnough;
    if (!nearest || nearest.likeness < enough || nearest.likeness <= (best?.likeness ?? 0)) continue;
    const id = names[keyOwners[nearest.place]?.name ?? -1]?.id;
    if (id !== undefined) best = { ids: [id], end, likeness: nearest.likeness };
  }
  return best;
}
