import type { Chapter } from '../../../shared/domain/chapters/chapter';
import type { ChapterFields } from '../../../shared/domain/chapters/editChapters';
import { type ChapterKind, chapterKinds } from '../../../shared/domain/words';

export const kindNames = {
  briefing: 'Briefing',
  'warm-up': 'Warm-up',
  activation: 'Activation',
  mobility: 'Mobility',
  demo: 'Demo',
  substitution: 'Substitution',
  workout: 'Workout',
  accessory: 'Accessory',
  'cool-down': 'Cool-down',
  aside: 'Aside',
} as const satisfies Record<ChapterKind, string>;

/** The digit that gives the chosen chapter a kind: in order, 0 for the last. */
export const kindKeys = Object.fromEntries(chapterKinds.map((kind, at) => [kind, String((at + 1) % 10)])) as Record<
  ChapterKind,
  string
>;

export type Names = ReadonlyMap<string, string>;

type Named = Pick<Chapter, 'kind' | 'movementId'>;

/** What a chapter is called while nobody gave it a title: its movement where it shows one, else its kind. */
export function ownName({ kind, movementId }: Named, movements: Names): string {
  const movement = movementId === null ? undefined : movements.get(movementId);
  const shows = kind === 'demo' || kind === 'substitution';
  return (shows ? movement : undefined) ?? kindNames[kind];
}

/** A change with the title that follows from it, unless somebody wrote one of their own. */
export function withOwnName(
  chapter: Chapter,
  change: Partial<ChapterFields>,
  movements: Names,
): Partial<ChapterFields> {
  const isOwn = chapter.title === ownName(chapter, movements) || chapter.title === kindNames[chapter.kind];
  if (!isOwn || 'title' in change) return change;
  return { ...change, title: ownName({ ...chapter, ...change }, movements) };
}
