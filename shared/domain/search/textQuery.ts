import { folded, isFiller, singular, wordsOf } from './plainWords';

/** What a text search is asked for; a query with more words is cut. */
const mostWords = 12;

/**
 * Left-over words as a query that all must match, for `websearch_to_tsquery('coach', …)`. Each word stands in quotes and holds
 * letters and digits alone, so that none is read as an operator ("or", "-"); single letters are left out.
 * @returns an empty text where there is nothing to search for
 */
export const allWords = (words: readonly string[]) => safeWords(words).map(quoted).join(' ');

/** The same words where any one is enough. */
export const anyWord = (words: readonly string[]) => safeWords(words).map(quoted).join(' or ');

/**
 * The same words for `to_tsquery('coach', …)`, the last one unfinished: 'knee' & 'cav':*. A beginning of one or two letters is
 * searched as it is: a prefix that short reads half of the index.
 */
export function unfinishedWords(words: readonly string[]): string {
  const safe = safeWords(words);
  return safe
    .map((word, i) => (i === safe.length - 1 && [...word].length > 2 ? `'${word}':*` : `'${word}'`))
    .join(' & ');
}

const quoted = (word: string) => `"${word}"`;

function safeWords(words: readonly string[]): string[] {
  const parts = words.flatMap(wordsOf).filter((word) => [...word].length > 1 && word.length <= 40);
  const meaningful = parts.filter((word) => !isFiller(word));
  return [...new Set(meaningful.length > 0 ? meaningful : parts)].slice(0, mostWords);
}

export type Piece = { text: string; marked: boolean };

/**
 * A line in pieces, those marked that a search for the words found: the same word in any case, with any accent or ending
 * ("cave" marks "caving"). Joined together the pieces are the line.
 */
export function markWords(text: string, words: readonly string[]): Piece[] {
  const stems = new Set(words.flatMap(wordsOf).map(stemOf));
  const pieces: Piece[] = [];
  for (const part of text.split(/([\p{L}\p{N}\p{M}'’]+)/u)) {
    if (part === '') continue;
    const marked = stems.has(stemOf(folded(part).replace(/['’]/g, '')));
    const last = pieces.at(-1);
    if (last && !last.marked && !marked) last.text += part;
    else pieces.push({ text: part, marked });
  }
  return pieces;
}

/** A rough stem, close to what the text search takes for the same word; only for marking what was found already. */
function stemOf(word: string): string {
  const base = singular(word.replace(/ied$/, 'y'));
  const bare = base.replace(/(?:ing|ed|e)$/, '');
  if (bare.length < 3 || !/[aeiouy]/.test(bare)) return base;
  // "squatting" has doubled what "squat" has once
  return bare === base ? base : bare.replace(/([bdgmnprt])\1$/, '$1');
}
