/** Words as search compares them: no case, accents, hyphens or plurals. */

/** Letters that do not come apart into a letter and an accent. */
const spelledOut: Readonly<Record<string, string>> = {
  ß: 'ss',
  æ: 'ae',
  œ: 'oe',
  ø: 'o',
  ł: 'l',
  đ: 'd',
  ð: 'd',
  þ: 'th',
  ı: 'i',
};

/** Lower case without accents: "Développé" → "developpe". */
export const folded = (text: string) =>
  text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .replace(/[ßæœøłđðþı]/g, (letter) => spelledOut[letter] ?? letter);

/** The words of a text as they stand, folded: "Hang-Cleans!" → "hang", "cleans". An apostrophe does not part a word. */
export const wordsOf = (text: string): string[] =>
  folded(text)
    .replace(/['’`]/g, '')
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== '');

/** Plurals that no rule gives, and figures that stand for words. */
const irregular: Readonly<Record<string, string>> = {
  calves: 'calf',
  feet: 'foot',
  knives: 'knife',
  halves: 'half',
  '1': 'one',
  '2': 'two',
};

/** One word in the form that is compared: "presses" → "press", "lunges" → "lunge", "flies" → "fly". */
export function singular(word: string): string {
  const known = irregular[word];
  if (known !== undefined) return known;
  if (word.length < 4 || !word.endsWith('s') || /(?:ss|us|is)$/.test(word)) return word;
  if (word.endsWith('ies')) return `${word.slice(0, -3)}y`;
  return /(?:ss|sh|ch|x|zz)es$/.test(word) ? word.slice(0, -2) : word.slice(0, -1);
}

/** Words of a question that name nothing. */
const fillers = new Set(
  'a an and any are be can demo demos do does exercise exercises find for from have how i im in instead is it me movement my of on or please see should show some the this to using video videos want what with'.split(
    ' ',
  ),
);

export const isFiller = (word: string) => fillers.has(word);

/** Words that coaches use for each other: "single-arm" and "one-arm" are one movement. */
const twins: ReadonlyMap<string, string> = new Map([
  ['one', 'single'],
  ['single', 'one'],
  ['two', 'double'],
  ['double', 'two'],
]);

export const twinOf = (word: string) => twins.get(word);
