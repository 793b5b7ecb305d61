import type { CaptionLine } from './captionLine';

export type LineChange = 'same' | 'added' | 'removed' | 'changed';

export type LineDifference = {
  base: CaptionLine | null;
  mine: CaptionLine | null;
  theirs: CaptionLine | null;
  myChange: LineChange;
  theirChange: LineChange;
  /** both touched it and did not end up the same: somebody has to decide */
  conflict: boolean;
};

/**
 * What differs between two people's versions of a recording's caption lines, in the order of time. Lines have no ids:
 * equal lines are the same line, and what is left is paired with the line that it shares most time with.
 * @param base the version that both started from
 */
export function compareLineVersions(
  base: readonly CaptionLine[],
  mine: readonly CaptionLine[],
  theirs: readonly CaptionLine[],
): LineDifference[] {
  const my = pairLines(base, mine);
  const their = pairLines(base, theirs);
  const added = pairLines(my.added, their.added);
  return [
    ...base.map((line, i) => difference(line, my.partners[i] ?? null, their.partners[i] ?? null)),
    ...my.added.map((line, i) => difference(null, line, added.partners[i] ?? null)),
    ...added.added.map((line) => difference(null, null, line)),
  ]
    .filter(({ myChange, theirChange }) => myChange !== 'same' || theirChange !== 'same')
    .toSorted((a, b) => startOf(a) - startOf(b));
}

const startOf = ({ base, mine, theirs }: LineDifference) => (base ?? mine ?? theirs)?.startMs ?? 0;

function difference(base: CaptionLine | null, mine: CaptionLine | null, theirs: CaptionLine | null): LineDifference {
  const myChange = changeOf(base, mine);
  const theirChange = changeOf(base, theirs);
  const conflict = myChange !== 'same' && theirChange !== 'same' && changeOf(mine, theirs) !== 'same';
  return { base, mine, theirs, myChange, theirChange, conflict };
}

function changeOf(from: CaptionLine | null, to: CaptionLine | null): LineChange {
  if (!from) return to ? 'added' : 'same';
  if (!to) return 'removed';
  return keyOf(from) === keyOf(to) ? 'same' : 'changed';
}

const keyOf = ({ startMs, endMs, text }: CaptionLine) => `${startMs} ${endMs} ${text}`;

/** For each of `from` its partner in `to`, and those of `to` that have none. */
function pairLines(from: readonly CaptionLine[], to: readonly CaptionLine[]) {
  const partners: (CaptionLine | null)[] = from.map(() => null);
  const free = new Map<string, CaptionLine[]>();
  for (const line of to) free.set(keyOf(line), [...(free.get(keyOf(line)) ?? []), line]);
  from.forEach((line, i) => {
    partners[i] = free.get(keyOf(line))?.shift() ?? null;
  });

  const left = [...free.values()].flat();
  const pairs = from
    .flatMap((line, i) => (partners[i] ? [] : left.map((other) => ({ i, other, shared: sharedMs(line, other) }))))
    .filter(({ shared }) => shared > 0)
    .toSorted((a, b) => b.shared - a.shared);
  const taken = new Set<CaptionLine>();
  for (const { i, other } of pairs) {
    if (partners[i] || taken.has(other)) continue;
    partners[i] = other;
    taken.add(other);
  }
  return { partners, added: left.filter((line) => !taken.has(line)) };
}

const sharedMs = (a: CaptionLine, b: CaptionLine) => Math.min(a.endMs, b.endMs) - Math.max(a.startMs, b.startMs);
