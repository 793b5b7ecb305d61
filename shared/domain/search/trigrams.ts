/** The different runs of three letters of a text, its edges marked so that beginnings count twice. */
export function trigramsOf(text: string): Set<string> {
  const padded = `  ${text} `;
  const grams = new Set<string>();
  for (let i = 0; i + 3 <= padded.length; i++) grams.add(padded.slice(i, i + 3));
  return grams;
}

/** Dice's coefficient of two sets: twice what they share by what they hold. */
export const shareOf = (shared: number, sizeA: number, sizeB: number) => (2 * shared) / (sizeA + sizeB);
