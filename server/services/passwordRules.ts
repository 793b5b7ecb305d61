import { limits } from '../../shared/limits';

/**
 * Refuses passwords that are guessed first. ASVS 5.0 6.2.4 asks for the 3,000 most used ones that match the policy; with
 * 15 characters as the least hardly one of them does, and those are rows of keys, repeats and a few words run together.
 * So the rule takes such parts away and looks at what is left, which also covers what no list has. No rule asks for
 * kinds of characters (6.2.5).
 */

/** as they are typed in a row; each is read forwards and backwards */
const rows = [
  'abcdefghijklmnopqrstuvwxyz',
  '01234567890123456789',
  'qwertyuiop',
  'qwertzuiop',
  'azertyuiop',
  'asdfghjkl',
  'zxcvbnm',
  'yxcvbnm',
  '!@#$%^&*()',
  '1qaz2wsx3edc4rfv5tgb6yhn7ujm8ik9ol0p',
  '1q2w3e4r5t6y7u8i9o0p',
].flatMap((row) => [row, [...row].toReversed().join('')]);
const shortestRow = 4;

/** words that people put into passwords most, and the product's own */
const usualWords =
  'password passwort passphrase passcode letmein welcome changeme iloveyou administrator admin default secret access master login superuser user guest root test temp hello love trustno sunshine princess football baseball monkey dragon shadow flower summer winter spring autumn monday january correcthorsebatterystaple tapeline training workout coach fitness'.split(
    ' ',
  );

/** characters that must be left after all that; eight are an ordinary word and a bit */
const leastLeft = 8;

/** Signs that stand for letters in words that are tried first. */
const lookalikes: Record<string, string> = {
  '@': 'a',
  '4': 'a',
  '3': 'e',
  '1': 'i',
  '!': 'i',
  '0': 'o',
  $: 's',
  '5': 's',
};

/**
 * What is wrong with a new password, as a sentence for its field; undefined when nothing is. Its length is the contract's.
 * @param own the person's e-mail, name and teams: whoever knows them tries them first
 */
export function passwordFault(password: string, own: readonly string[]): string | undefined {
  const typed = password.normalize('NFKC').toLowerCase();
  if (repeatedPart(typed).length < limits.passwordMin)
    return 'This repeats itself. Take a few words that have nothing to do with each other.';
  const words = [...own.flatMap(wordsOf), ...usualWords].toSorted((a, b) => b.length - a.length);
  const left = withoutWords(withoutRows(typed), words);
  if (new Set(left).size < leastLeft / 2 || left.length < leastLeft)
    return 'This is easy to guess from rows of keys, usual words, or your name, e-mail or team. Take a few words that have nothing to do with each other.';
  return undefined;
}

/** The shortest beginning that, repeated, makes the whole; the last repeat may be cut off. */
function repeatedPart(text: string): string {
  for (let length = 1; length <= text.length / 2; length++)
    if (text.slice(length) === text.slice(0, -length)) return text.slice(0, length);
  return text;
}

/** Each row of keys and each run of one character counts as a single one. */
function withoutRows(text: string): string {
  let left = '';
  for (let at = 0; at < text.length; ) {
    left += text[at];
    at += Math.max(1, rowLength(text.slice(at)));
  }
  return left;
}

function rowLength(text: string): number {
  const same = /^(.)\1*/su.exec(text)?.[0].length ?? 1;
  let longest = same >= 3 ? same : 1;
  for (let length = shortestRow; length <= text.length; length++) {
    if (!rows.some((row) => row.includes(text.slice(0, length)))) break;
    longest = Math.max(longest, length);
  }
  return longest;
}

/** Letters and digits that are in none of the words, longest words taken out first. */
function withoutWords(text: string, words: readonly string[]): string {
  const plain = (value: string) => value.replace(/[^\p{L}\p{N}]/gu, '');
  const spelled = (value: string) => plain([...value].map((sign) => lookalikes[sign] ?? sign).join(''));
  const leftOf = (value: string) => words.reduce((left, word) => left.replaceAll(word, ''), value);
  const readings = [leftOf(plain(text)), leftOf(spelled(text))];
  return readings.toSorted((a, b) => a.length - b.length)[0] ?? '';
}

function wordsOf(own: string): string[] {
  const lower = own.normalize('NFKC').toLowerCase();
  const words = lower.split(/[^\p{L}\p{N}]+/u).filter((word) => word.length >= 3);
  const together = lower.replace(/[^\p{L}\p{N}]/gu, '');
  return together.length >= 3 ? [together, ...words] : words;
}
