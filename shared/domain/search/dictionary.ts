import type { KitNeed } from '../kit/kit';
import type { Pattern } from '../words';
import { LikenessIndex } from './likeness';
import { isFiller, singular, twinOf, wordsOf } from './plainWords';

export type NamedMovement = {
  id: string;
  name: string;
  otherNames: readonly string[];
  pattern: Pattern;
  kitNeeded?: readonly KitNeed[];
};
export type NamedKit = { id: string; name: string; otherNames: readonly string[] };

/** One name of a movement or of a kit item, ready to be compared. */
export type Name = {
  id: string;
  /** as people wrote it */
  text: string;
  words: readonly string[];
  /** its words run together, so that "kettle bell" and "kettlebell" are one */
  key: string;
  /** the same with "one" for "single" and the like; the key itself first */
  keys: readonly string[];
  isMain: boolean;
  /** different words that are no fillers; at least 1 */
  countedWords: number;
};

/** Names that can be found by likeness of their whole key. */
export type NameList = {
  names: readonly Name[];
  byKey: ReadonlyMap<string, readonly number[]>;
  /** the keys of `byKey` in order, to look up beginnings */
  sortedKeys: readonly string[];
  likeKeys: LikenessIndex;
  /** `likeKeys` place → name; a name is there twice when its words in another order differ */
  keyOwners: readonly { name: number; reordered: boolean }[];
};

/** A team's names, indexed once and used for every query. */
export type SearchDictionary = {
  movements: ReadonlyMap<string, NamedMovement>;
  movementNames: NameList;
  kitNames: NameList;
  kitIds: readonly string[];
  /** last word of a kit item's names → items: "bar" for the pull-up bar */
  kitByLastWord: ReadonlyMap<string, ReadonlySet<string>>;
  /** short names of kit ("kb") → its words, so that one that stands inside a movement's name is understood */
  shortNames: ReadonlyMap<string, readonly string[]>;
  /** every different word of the movements' names */
  vocabulary: readonly string[];
  vocabularyIndex: LikenessIndex;
  /** word → names that hold it */
  namesByWord: ReadonlyMap<string, readonly number[]>;
  /** word of a kit item's name → movements that need it */
  movementsByKitWord: ReadonlyMap<string, ReadonlySet<string>>;
};

/**
 * Indexes the names of a team's movements and kit; about 30 ms for 1,000 movements.
 * @param movements with `kitNeeded`, "dumbbell" finds what needs one even where no name says so
 */
export function buildDictionary(movements: readonly NamedMovement[], kit: readonly NamedKit[]): SearchDictionary {
  const shortNames = shortNamesOf(kit);
  const movementNames = nameList(movements, shortNames);
  const kitNames = nameList(kit, shortNames);
  const namesByWord = new Map<string, number[]>();
  movementNames.names.forEach((name, i) => {
    for (const word of new Set(name.words.flatMap((word) => [word, twinOf(word) ?? word]))) addTo(namesByWord, word, i);
  });
  const vocabulary = [...namesByWord.keys()];
  const vocabularyIndex = new LikenessIndex();
  for (const word of vocabulary) vocabularyIndex.add(word);
  return {
    movements: new Map(movements.map((movement) => [movement.id, movement])),
    movementNames,
    kitNames,
    kitIds: kit.map((item) => item.id),
    kitByLastWord: kitByLastWord(kitNames.names),
    shortNames,
    vocabulary,
    vocabularyIndex,
    namesByWord,
    movementsByKitWord: movementsByKitWord(movements, kitNames.names),
  };
}

/** The words of a name or a query in the form that is compared. */
export function comparableWords(text: string, shortNames: SearchDictionary['shortNames']): string[] {
  return wordsOf(text).flatMap((word) => shortNames.get(word) ?? shortNames.get(singular(word)) ?? [singular(word)]);
}

/** Words in an order of their own, run together: what a name and a query share when only their order differs. */
export const reorderedKey = (words: readonly string[]) =>
  words
    .filter((word) => !isFiller(word))
    .toSorted()
    .join('');

function nameList(
  things: readonly { id: string; name: string; otherNames: readonly string[] }[],
  shortNames: SearchDictionary['shortNames'],
): NameList {
  const names: Name[] = [];
  const byKey = new Map<string, number[]>();
  const likeKeys = new LikenessIndex();
  const keyOwners: { name: number; reordered: boolean }[] = [];
  for (const { id, name, otherNames } of things) {
    for (const text of new Set([name, ...otherNames])) {
      const words = comparableWords(text, shortNames);
      const key = words.join('');
      if (key === '') continue;
      const twinned = words.map((word) => twinOf(word) ?? word);
      const keys = [...new Set([key, twinned.join('')])];
      const at =
        names.push({ id, text, words, key, keys, isMain: text === name, countedWords: countedWords(words) }) - 1;
      for (const one of keys) {
        addTo(byKey, one, at);
        likeKeys.add(one);
        keyOwners.push({ name: at, reordered: false });
      }
      for (const one of new Set([reorderedKey(words), reorderedKey(twinned)])) {
        if (one === '' || keys.includes(one)) continue;
        likeKeys.add(one);
        keyOwners.push({ name: at, reordered: true });
      }
    }
  }
  return { names, byKey, sortedKeys: [...byKey.keys()].sort(), likeKeys, keyOwners };
}

const countedWords = (words: readonly string[]) => Math.max(1, new Set(words.filter((word) => !isFiller(word))).size);

/** The keys that begin with a text and go on. */
export function keysBegunBy(text: string, { sortedKeys }: NameList): readonly string[] {
  let low = 0;
  let high = sortedKeys.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sortedKeys[middle] ?? '') <= text) low = middle + 1;
    else high = middle;
  }
  let end = low;
  while (sortedKeys[end]?.startsWith(text)) end += 1;
  return sortedKeys.slice(low, end);
}

/** Two or three letters that stand for one item of kit. Where two items claim the same letters, none has them. */
function shortNamesOf(kit: readonly NamedKit[]): Map<string, readonly string[]> {
  const found = new Map<string, readonly string[]>();
  const claimed = new Map<string, string>();
  for (const { id, name, otherNames } of kit) {
    for (const otherName of otherNames) {
      const [word, ...more] = wordsOf(otherName);
      if (!word || more.length > 0 || word.length > 3) continue;
      if (claimed.has(word) && claimed.get(word) !== id) found.delete(word);
      else found.set(word, wordsOf(name).map(singular));
      claimed.set(word, id);
    }
  }
  return found;
}

function kitByLastWord(kitNames: readonly Name[]): Map<string, Set<string>> {
  const found = new Map<string, Set<string>>();
  for (const { id, words } of kitNames) {
    const last = words.at(-1) ?? '';
    found.set(last, (found.get(last) ?? new Set()).add(id));
  }
  return found;
}

function movementsByKitWord(movements: readonly NamedMovement[], kitNames: readonly Name[]): Map<string, Set<string>> {
  const wordsOfKit = new Map<string, Set<string>>();
  for (const { id, words } of kitNames) {
    const known = wordsOfKit.get(id) ?? new Set();
    for (const word of words) if (!isFiller(word)) known.add(word);
    wordsOfKit.set(id, known);
  }
  const found = new Map<string, Set<string>>();
  for (const { id, kitNeeded = [] } of movements) {
    for (const { kitItemId } of kitNeeded.flatMap((need) => need.anyOf)) {
      for (const word of wordsOfKit.get(kitItemId) ?? []) found.set(word, (found.get(word) ?? new Set()).add(id));
    }
  }
  return found;
}

function addTo(map: Map<string, number[]>, key: string, value: number) {
  const values = map.get(key);
  if (values) values.push(value);
  else map.set(key, [value]);
}
