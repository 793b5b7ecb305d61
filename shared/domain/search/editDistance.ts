/**
 * Damerau–Levenshtein distance in its restricted form, "optimal string alignment": insertions, deletions, replacements and swaps
 * of neighbours, no stretch edited twice. So CA → ABC is 3 (the unrestricted form says 2); a typist's slip is never that deep.
 */
export function editDistance(a: string, b: string): number {
  if (a === b) return 0;
  if (b.length >= rows[0].length) for (const i of [0, 1, 2] as const) rows[i] = new Uint16Array(2 * b.length);
  let [beforeLast, last, row] = rows;
  for (let j = 0; j <= b.length; j++) last[j] = j;
  for (let i = 1; i <= a.length; i++) {
    row[0] = i;
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1];
      let best = Math.min((last[j] ?? 0) + 1, (row[j - 1] ?? 0) + 1, (last[j - 1] ?? 0) + (same ? 0 : 1));
      const isSwap = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1];
      if (isSwap) best = Math.min(best, (beforeLast[j - 2] ?? 0) + 1);
      row[j] = best;
    }
    [beforeLast, last, row] = [last, row, beforeLast];
  }
  return last[b.length] ?? 0;
}

/** Three rows that every call uses again: a query makes thousands of comparisons. */
const rows: [Uint16Array, Uint16Array, Uint16Array] = [new Uint16Array(64), new Uint16Array(64), new Uint16Array(64)];

/** 1 for the same text, 0 for nothing in common. */
export function editLikeness(a: string, b: string): number {
  const longest = Math.max(a.length, b.length);
  return longest === 0 ? 1 : 1 - editDistance(a, b) / longest;
}
