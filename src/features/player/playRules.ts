type Span = { startMs: number; endMs: number };

/** What a chapter's end may be overrun by before its loop is seen as left: a tab in the background looks four times a second. */
const overrunMs = 1500;

/** The stretch to pass over at a time: an aside that the person does not see. */
export function skipAt(skips: readonly Span[], atMs: number): Span | undefined {
  return skips.find(({ startMs, endMs }) => startMs <= atMs && atMs < endMs);
}

/**
 * What a loop does at a time.
 * @returns `again` from the chapter's start, `stay` inside it, or `left`: somebody went elsewhere
 */
export function loopStep(chapter: Span, atMs: number, durationMs: number): 'stay' | 'again' | 'left' {
  if (atMs >= chapter.startMs && atMs < Math.min(chapter.endMs, durationMs)) return 'stay';
  return atMs >= chapter.endMs && atMs < chapter.endMs + overrunMs ? 'again' : 'left';
}

/** A press on “previous” this far into a chapter starts it again; earlier, it goes to the one before. */
export const againAfterMs = 3000;

/** The stretches of a recording that no chapter covers, and whether they are passed over. */
export function gapsOf(
  chapters: readonly Span[],
  skips: readonly Span[],
  durationMs: number,
): (Span & { gap: 'open' | 'skipped' })[] {
  const taken = [
    ...chapters.map((chapter) => ({ ...chapter, skipped: false })),
    ...skips.map((skip) => ({ ...skip, skipped: true })),
  ].toSorted((a, b) => a.startMs - b.startMs);
  const gaps: (Span & { gap: 'open' | 'skipped' })[] = [];
  let at = 0;
  for (const { startMs, endMs, skipped } of taken) {
    if (startMs > at) gaps.push({ startMs: at, endMs: startMs, gap: 'open' });
    if (skipped && endMs > at) gaps.push({ startMs: Math.max(at, startMs), endMs, gap: 'skipped' });
    at = Math.max(at, endMs);
  }
  if (at < durationMs) gaps.push({ startMs: at, endMs: durationMs, gap: 'open' });
  return gaps;
}
