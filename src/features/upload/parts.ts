/** How an upload is divided; the numbers come from the server. */
export type Division = { sizeBytes: number; partBytes: number; partCount: number };

/** Where a part's bytes lie in the file. @param number from 1 */
export function rangeOfPart({ sizeBytes, partBytes }: Division, number: number): { from: number; to: number } {
  const from = (number - 1) * partBytes;
  return { from, to: Math.min(sizeBytes, from + partBytes) };
}

/** The numbers of parts that the store does not hold yet, in order. */
export function missingParts({ partCount }: Division, held: ReadonlySet<number>): number[] {
  return Array.from({ length: partCount }, (_, i) => i + 1).filter((number) => !held.has(number));
}

/** Bytes that have arrived: whole parts, and what is known of those on their way. */
export function arrivedBytes(
  division: Division,
  held: ReadonlySet<number>,
  onTheirWay: ReadonlyMap<number, number>,
): number {
  let bytes = 0;
  for (const number of held) {
    const { from, to } = rangeOfPart(division, number);
    bytes += to - from;
  }
  for (const [number, loaded] of onTheirWay) if (!held.has(number)) bytes += loaded;
  return Math.min(bytes, division.sizeBytes);
}
