import { type Pattern, patterns } from '../words';
import { comparableWords, keysBegunBy, type Name, reorderedKey, type SearchDictionary } from './dictionary';
import { isFiller, singular, wordsOf } from './plainWords';
import { takeWithout } from './withoutKit';

export type ResolvedMovement = {
  id: string;
  /** 0 to 1 */
  score: number;
  /** the name that matched, or the pattern */
  matched: string;
};

export type ResolvedQuery = {
  /** what the query means, best first; empty where nothing is sure enough */
  movements: ResolvedMovement[];
  /** what it may have meant, where nothing is sure */
  didYouMean: ResolvedMovement[];
  /** kit to do without */
  without: string[];
  /** words that name no movement, for the search in what was said; all of them where no movement is sure */
  leftOver: string[];
  /** whether the query names a movement or a pattern */
  accepted: boolean;
};

/** Scores from which a movement is meant, and from which it may be. Source: measured with made-up queries. */
const sure = 0.6;
const maybe = 0.45;

/** A query's words beyond these say nothing more about which movement is meant. */
const mostWords = 12;
const longestWindow = 6;
/** What is this much worse than the best is not what was meant. */
const tail = 0.3;
const mostMovements = 200;
const mostMaybes = 5;

/**
 * Which movements a query means. "no rope" and the like are taken out first. Then every stretch of 1 to 6 words is compared with
 * all names (the same, its beginning, alike), single words with the words of names in any order, and pattern words with patterns;
 * each weighs by how much of the query it explains.
 */
export function resolve(dictionary: SearchDictionary, query: string): ResolvedQuery {
  const spelled = spelledOut(query.slice(0, 200));
  const taken = takeWithout(comparableWords(spelled, dictionary.shortNames), dictionary);
  const { without } = taken;
  const words = taken.rest.filter((word) => word !== 'no' && word !== 'without');
  const asked = words.slice(0, mostWords);
  const found = new Found(asked.filter((word) => !isFiller(word)).length || asked.length);
  matchWindows(dictionary, asked, found);
  matchWords(dictionary, asked, found);
  matchPatterns(dictionary, asked, found);

  const ranked = found.ranked(dictionary);
  const best = ranked[0]?.score ?? 0;
  const accepted = best >= sure;
  const movements = ranked
    .filter(({ score, isPattern }) => score >= sure && (isPattern || score >= best - tail))
    .slice(0, mostMovements);
  const covered = new Set(
    accepted ? ranked.filter((one) => one.score === best || one.isExact).flatMap((one) => [...one.covers]) : [],
  );
  return {
    movements: movements.map(asResolved),
    didYouMean: accepted ? [] : ranked.slice(0, mostMaybes).map(asResolved),
    without,
    leftOver: leftOver(words, covered, spelled),
    accepted,
  };
}

/** What punctuation says, in words: "w/o" is without, "w/" with, a comma and. */
const spelledOut = (query: string) =>
  query
    .replace(/\bw\/\s?o\b/gi, ' without ')
    .replace(/\bw\//gi, ' with ')
    .replaceAll(',', ' and ');

const asResolved = ({ id, score, matched }: Match): ResolvedMovement => ({
  id,
  // down, so that nothing short of sure reads as sure
  score: Math.floor(score * 1000) / 1000,
  matched,
});

/** Left-over words as they were typed: a text search has its own idea of plurals. */
function leftOver(words: readonly string[], covered: ReadonlySet<number>, spelled: string): string[] {
  const typed = new Map(wordsOf(spelled).map((word) => [singular(word), word]));
  const left = words.filter((word, i) => !covered.has(i) && !isFiller(word)).map((word) => typed.get(word) ?? word);
  return [...new Set(left)];
}

type Match = {
  id: string;
  score: number;
  matched: string;
  covers: ReadonlySet<number>;
  isExact: boolean;
  isPattern: boolean;
  isMain: boolean;
  length: number;
};

/** The best match of each movement. */
class Found {
  readonly #best = new Map<string, Match>();
  #bestScore = 0;

  constructor(readonly countedWords: number) {}

  /** Whether covering so many words could change the answer: be sure, or be a guess while nothing is sure. */
  canMatter(coveredWords: number): boolean {
    const atBest = this.#share(coveredWords);
    return this.#bestScore < sure ? atBest >= maybe : atBest >= Math.max(sure, this.#bestScore - tail);
  }

  #share(coveredWords: number) {
    return 0.4 + 0.6 * Math.min(1, coveredWords / Math.max(1, this.countedWords));
  }

  /** @param raw how well the covered words match; the score also weighs how much of the query they are */
  add(match: Omit<Match, 'score'>, raw: number, coveredWords: number) {
    const score = raw * this.#share(coveredWords);
    this.#bestScore = Math.max(this.#bestScore, score);
    const known = this.#best.get(match.id);
    if (!known || score > known.score) this.#best.set(match.id, { ...match, score });
  }

  ranked(dictionary: SearchDictionary): Match[] {
    const name = ({ id }: Match) => dictionary.movements.get(id)?.name ?? '';
    return [...this.#best.values()]
      .filter(({ score }) => score >= maybe)
      .sort(
        (a, b) =>
          b.score - a.score ||
          Number(b.isMain) - Number(a.isMain) ||
          a.length - b.length ||
          (name(a) < name(b) ? -1 : 1),
      );
  }
}

const ofName = ({ id, text, isMain, key }: Name) => ({
  id,
  matched: text,
  isMain,
  length: key.length,
  isPattern: false,
});

type Window = { words: readonly string[]; key: string; covers: ReadonlySet<number>; counted: number };

/** Stretches of the query, longer ones first. */
function windowsOf(words: readonly string[]): Window[] {
  const windows: Window[] = [];
  for (let length = Math.min(longestWindow, words.length); length > 0; length--) {
    for (let from = 0; from + length <= words.length; from++) {
      const window = words.slice(from, from + length);
      const counted = window.filter((word) => !isFiller(word)).length;
      if (counted === 0) continue;
      windows.push({ words: window, key: window.join(''), covers: new Set(window.map((_, i) => from + i)), counted });
    }
  }
  return windows;
}

/** Stretches of the query against whole names: first what is typed in full or begun, then what is alike. */
function matchWindows({ movementNames }: SearchDictionary, words: readonly string[], found: Found) {
  const { names, byKey, likeKeys, keyOwners } = movementNames;
  const windows = windowsOf(words);
  for (const { key, covers, counted } of windows) {
    for (const at of byKey.get(key) ?? []) {
      const name = names[at];
      if (name) found.add({ ...ofName(name), covers, isExact: true }, 1, counted);
    }
    if (key.length < 3) continue;
    for (const begun of keysBegunBy(key, movementNames)) {
      for (const at of byKey.get(begun) ?? []) {
        const name = names[at];
        if (name)
          found.add({ ...ofName(name), covers, isExact: false }, 0.68 + 0.27 * (key.length / begun.length), counted);
      }
    }
  }
  for (const { words: window, key, covers, counted } of windows) {
    // a whole name was typed: what is merely alike was not meant; a filler at the edge only blurs what is within
    const isBlurred = isFiller(window[0] ?? '') || isFiller(window.at(-1) ?? '');
    if (byKey.has(key) || key.length < 4 || isBlurred || !found.canMatter(counted)) continue;
    const reordered = window.length > 1 ? reorderedKey(window) : key;
    for (const asked of new Set([key, reordered])) {
      for (const { place, likeness } of likeKeys.nearest(asked)) {
        const owner = keyOwners[place];
        const name = owner && names[owner.name];
        if (!name) continue;
        // the right words in another order count a little less
        const turned = asked !== key || owner.reordered ? 0.95 : 1;
        found.add({ ...ofName(name), covers, isExact: false }, Math.min(likeness, 0.97) * turned, counted);
      }
    }
  }
}

/** A word that is nearly one of a name's must be this close to stand for it. */
const nearWord = 0.68;

/** Single words against the words of names, in any order: "row one dumbbell" means the one-arm dumbbell row. */
function matchWords(dictionary: SearchDictionary, words: readonly string[], found: Found) {
  const { names } = dictionary.movementNames;
  /** name → query word → how well it is in the name */
  const hits = new Map<number, Map<number, { weight: number; word: string }>>();
  words.forEach((word, i) => {
    if (isFiller(word)) return;
    for (const [known, weight] of nearWords(dictionary, word)) {
      for (const at of dictionary.namesByWord.get(known) ?? []) {
        const ofThisName = hits.get(at) ?? new Map();
        if ((ofThisName.get(i)?.weight ?? 0) < weight) ofThisName.set(i, { weight, word: known });
        hits.set(at, ofThisName);
      }
    }
  });
  for (const [at, ofThisName] of hits) {
    const name = names[at];
    if (!name) continue;
    const matched = new Set([...ofThisName.values()].map((hit) => hit.word));
    const inName = matched.size / name.countedWords;
    // a word of the kit that the movement needs is explained too, though the name does not say it
    const kitWords = words.flatMap((word, i) =>
      !ofThisName.has(i) && dictionary.movementsByKitWord.get(word)?.has(name.id) ? [i] : [],
    );
    const quality = [...ofThisName.values()].reduce((sum, hit) => sum + hit.weight, 0) / ofThisName.size;
    found.add(
      { ...ofName(name), covers: new Set([...ofThisName.keys(), ...kitWords]), isExact: false },
      quality * (0.55 + 0.4 * inName),
      ofThisName.size + kitWords.length,
    );
  }
}

/** The words of the dictionary that a typed word may be: itself, what it begins, what it is alike. */
function nearWords(dictionary: SearchDictionary, word: string): Map<string, number> {
  if (dictionary.namesByWord.has(word)) return new Map([[word, 1]]);
  const near = new Map<string, number>();
  if (word.length < 3) return near;
  for (const known of dictionary.vocabulary) if (known.startsWith(word)) near.set(known, 0.92);
  if (word.length < 4) return near;
  for (const { place, likeness } of dictionary.vocabularyIndex.nearest(word)) {
    const known = dictionary.vocabulary[place];
    if (known !== undefined && likeness >= nearWord) near.set(known, Math.max(near.get(known) ?? 0, likeness));
  }
  return near;
}

const patternsByWord: ReadonlyMap<string, readonly Pattern[]> = new Map(
  patterns.flatMap((pattern) => pattern.split('/').map((word): [string, Pattern[]] => [word, [pattern]])),
);

/** "hinge" means every movement of that pattern, behind those that are called so. */
function matchPatterns(dictionary: SearchDictionary, words: readonly string[], found: Found) {
  words.forEach((word, i) => {
    const meant = patternsByWord.get(word);
    if (!meant) return;
    for (const { id, pattern, name } of dictionary.movements.values()) {
      if (!meant.includes(pattern)) continue;
      found.add(
        {
          id,
          matched: pattern,
          covers: new Set([i]),
          isExact: false,
          isPattern: true,
          isMain: true,
          length: name.length,
        },
        0.62,
        1,
      );
    }
  });
}
