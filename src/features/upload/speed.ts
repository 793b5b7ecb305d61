export type Sample = { atMs: number; bytes: number };

/** Long enough to even out single parts, short enough to follow a phone from one room to the next. */
const windowMs = 12_000;
/** A shorter time says nothing yet. */
const leastMs = 1500;

/** Adds how many bytes had arrived at a moment, and drops what is too old to count. */
export function withSample(samples: readonly Sample[], sample: Sample): Sample[] {
  return [...samples.filter((one) => sample.atMs - one.atMs <= windowMs), sample];
}

/** Bytes a second over the last samples; null while that cannot be told. */
export function speedOf(samples: readonly Sample[]): number | null {
  const [first, last] = [samples[0], samples.at(-1)];
  if (!first || !last || last.atMs - first.atMs < leastMs || last.bytes <= first.bytes) return null;
  return ((last.bytes - first.bytes) * 1000) / (last.atMs - first.atMs);
}

/** @returns milliseconds until the rest has arrived at this speed */
export function timeLeftMs(restBytes: number, bytesPerSecond: number | null): number | null {
  return bytesPerSecond === null ? null : (restBytes / bytesPerSecond) * 1000;
}
