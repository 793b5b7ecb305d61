import { Chapter } from './chapter';

export type Change = 'same' | 'added' | 'removed' | 'changed';

export type ChapterDifference = {
  id: string;
  base: Chapter | null;
  mine: Chapter | null;
  theirs: Chapter | null;
  myChange: Change;
  theirChange: Change;
  /** the fields that I changed, and that they changed, since the version that both started from */
  myFields: (keyof Chapter)[];
  theirFields: (keyof Chapter)[];
  /** both touched it and did not end up the same: somebody has to decide */
  conflict: boolean;
};

/**
 * What differs between two people's versions of a recording's chapters, by id, in the order of time.
 * @param base the version that both started from
 */
export function compareChapterVersions(
  base: readonly Chapter[],
  mine: readonly Chapter[],
  theirs: readonly Chapter[],
): ChapterDifference[] {
  const [baseById, mineById, theirsById] = [byId(base), byId(mine), byId(theirs)] as const;
  const ids = new Set([...baseById.keys(), ...mineById.keys(), ...theirsById.keys()]);
  return [...ids]
    .map((id) => difference(id, baseById.get(id) ?? null, mineById.get(id) ?? null, theirsById.get(id) ?? null))
    .filter(({ myChange, theirChange }) => myChange !== 'same' || theirChange !== 'same')
    .toSorted((a, b) => startOf(a) - startOf(b));
}

const byId = (chapters: readonly Chapter[]) => new Map(chapters.map((chapter) => [chapter.id, chapter]));

const startOf = ({ mine, theirs, base }: ChapterDifference) => (mine ?? theirs ?? base)?.startMs ?? 0;

function difference(id: string, base: Chapter | null, mine: Chapter | null, theirs: Chapter | null): ChapterDifference {
  const myChange = changeOf(base, mine);
  const theirChange = changeOf(base, theirs);
  return {
    id,
    base,
    mine,
    theirs,
    myChange,
    theirChange,
    myFields: changedFields(base, mine),
    theirFields: changedFields(base, theirs),
    conflict: myChange !== 'same' && theirChange !== 'same' && changeOf(mine, theirs) !== 'same',
  };
}

function changeOf(from: Chapter | null, to: Chapter | null): Change {
  if (!from) return to ? 'added' : 'same';
  if (!to) return 'removed';
  return changedFields(from, to).length > 0 ? 'changed' : 'same';
}

function changedFields(from: Chapter | null, to: Chapter | null): (keyof Chapter)[] {
  if (!from || !to) return [];
  return Chapter.keyof().options.filter((field) => from[field] !== to[field]);
}
