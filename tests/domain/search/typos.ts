/** Slips of a typist's fingers, the same ones every time. */

const neighbours: Readonly<Record<string, string>> = {
  a: 'sq',
  b: 'vn',
  c: 'xv',
  d: 'sf',
  e: 'wr',
  f: 'dg',
  g: 'fh',
  h: 'gj',
  i: 'uo',
  j: 'hk',
  k: 'jl',
  l: 'k',
  m: 'n',
  n: 'bm',
  o: 'ip',
  p: 'o',
  q: 'wa',
  r: 'et',
  s: 'ad',
  t: 'ry',
  u: 'yi',
  v: 'cb',
  w: 'qe',
  x: 'zc',
  y: 'tu',
  z: 'x',
};

/** Numbers from 0 to 1 that look random and come from the seed alone (a linear congruence, Numerical Recipes). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return state / 2 ** 32;
  };
}

/** One slip after the first letter: a letter left out, doubled, missed by one key, swapped, a key too many, or a space forgotten. */
export function slip(text: string, random: () => number): string {
  const at = 1 + Math.floor(random() * (text.length - 1));
  const letter = text[at] ?? '';
  const near = neighbours[letter.toLowerCase()] ?? letter;
  const wrong = near[Math.floor(random() * near.length)] ?? letter;
  const [before, after] = [text.slice(0, at), text.slice(at + 1)];
  switch (Math.floor(random() * 6)) {
    case 0:
      return before + after;
    case 1:
      return before + letter + letter + after;
    case 2:
      return before + wrong + after;
    case 3:
      return text.slice(0, at - 1) + letter + text[at - 1] + after;
    case 4:
      return before + wrong + letter + after;
    default:
      return text.replace(/[ -]/, '');
  }
}
