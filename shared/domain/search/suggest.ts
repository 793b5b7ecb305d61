import { comparableWords, type Name, type SearchDictionary } from './dictionary';
import { resolve } from './resolveQuery';

export type Suggestion = {
  id: string;
  name: string;
  /** the name that matched, which may be another one */
  matched: string;
};

/**
 * Movements while somebody types: every word but the last is a word of the name or its beginning, the last may be unfinished.
 * Where that gives fewer than the limit, what the text may mean with its typos follows.
 */
export function suggest(dictionary: SearchDictionary, typed: string, limit: number): Suggestion[] {
  const words = comparableWords(typed.slice(0, 200), dictionary.shortNames);
  if (words.length === 0) return [];
  const found = new Map<string, { name: Name; rank: number }>();
  for (const name of dictionary.movementNames.names) {
    const rank = rankOf(name, words);
    if (rank === undefined) continue;
    const known = found.get(name.id);
    if (!known || rank < known.rank) found.set(name.id, { name, rank });
  }
  const byBeginning = [...found.values()]
    .sort((a, b) => a.rank - b.rank || a.name.key.length - b.name.key.length || (a.name.text < b.name.text ? -1 : 1))
    .map(({ name }) => ({ id: name.id, matched: name.text }));
  const byMeaning = byBeginning.length < limit ? alike(dictionary, typed).filter(({ id }) => !found.has(id)) : [];
  return [...byBeginning, ...byMeaning]
    .slice(0, limit)
    .map(({ id, matched }) => ({ id, name: dictionary.movements.get(id)?.name ?? matched, matched }));
}

function alike(dictionary: SearchDictionary, typed: string): { id: string; matched: string }[] {
  const { movements, didYouMean } = resolve(dictionary, typed);
  return [...movements, ...didYouMean];
}

/** Lower is better: the name itself, its beginning, its words in order, its words in any order; another name after a main one. */
function rankOf(name: Name, words: readonly string[]): number | undefined {
  const typed = words.join('');
  const other = name.isMain ? 0 : 0.5;
  if (name.key === typed) return other;
  if (name.key.startsWith(typed)) return 1 + other;
  const free = [...name.words];
  let last = -1;
  let inOrder = true;
  for (const word of words) {
    const at = free.findIndex((candidate) => candidate.startsWith(word));
    if (at < 0) return undefined;
    free[at] = '';
    inOrder &&= at > last;
    last = at;
  }
  return (inOrder ? 2 : 3) + other;
}
