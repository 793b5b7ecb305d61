import { Cue } from '../../../shared/domain/chapters/cue';
import type { Difference } from '../../lib/mergeVersions';

/** What an edit leaves: the cues in order of time, or a sentence that says why not. */
export type CueEdit = { cues: readonly Cue[] } | { refused: string };

export const sortCues = (cues: readonly Cue[]): Cue[] =>
  cues.toSorted((a, b) => a.atMs - b.atMs || (a.id < b.id ? -1 : 1));

/** Adds a cue, or puts it in the place of the one with its id; checked as it would be on saving. */
export function putCue(cues: readonly Cue[], cue: Cue): CueEdit {
  const parsed = Cue.safeParse(cue);
  if (!parsed.success) return { refused: parsed.error.issues[0]?.message ?? 'This cue does not fit.' };
  return { cues: sortCues([...cues.filter(({ id }) => id !== cue.id), parsed.data]) };
}

export const removeCue = (cues: readonly Cue[], id: string): Cue[] => cues.filter((cue) => cue.id !== id);

/** A spoken line as a cue: one row, no longer than a cue may be, cut between words. */
export function cueFromLine(text: string): string {
  const row = text.replace(/\s+/g, ' ').trim();
  const most = 140;
  if (row.length <= most) return row;
  const cut = row.slice(0, most + 1).lastIndexOf(' ');
  return row.slice(0, cut > 0 ? cut : most);
}

const fields = Cue.keyof().options;
const differ = (a: Cue, b: Cue) => fields.some((field) => a[field] !== b[field]);

function changeOf(from: Cue | null, to: Cue | null): Difference<Cue>['myChange'] {
  if (!from) return to ? 'added' : 'same';
  if (!to) return 'removed';
  return differ(from, to) ? 'changed' : 'same';
}

/** What differs between two people's versions of a recording's cues, by id, in the order of time. */
export function compareCueVersions(
  base: readonly Cue[],
  mine: readonly Cue[],
  theirs: readonly Cue[],
): Difference<Cue>[] {
  const [inBase, inMine, inTheirs] = [base, mine, theirs].map((list) => new Map(list.map((cue) => [cue.id, cue])));
  const ids = new Set([...base, ...mine, ...theirs].map(({ id }) => id));
  return [...ids]
    .map((id) => {
      const sides = { base: inBase?.get(id) ?? null, mine: inMine?.get(id) ?? null, theirs: inTheirs?.get(id) ?? null };
      const myChange = changeOf(sides.base, sides.mine);
      const theirChange = changeOf(sides.base, sides.theirs);
      const conflict = myChange !== 'same' && theirChange !== 'same' && changeOf(sides.mine, sides.theirs) !== 'same';
      return { ...sides, myChange, theirChange, conflict };
    })
    .filter(({ myChange, theirChange }) => myChange !== 'same' || theirChange !== 'same')
    .toSorted((a, b) => startOf(a) - startOf(b));
}

const startOf = ({ mine, theirs, base }: Difference<Cue>) => (mine ?? theirs ?? base)?.atMs ?? 0;
