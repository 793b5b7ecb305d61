import { formatMsWithTenths } from '../timecode';
import type { Chapter } from './chapter';

export type ChapterFaultCode =
  | 'noLength'
  | 'pastEnd'
  | 'overlap'
  | 'sameId'
  | 'tooShort'
  | 'demoWithoutMovement'
  | 'substitutionWithoutMovement'
  | 'substitutionWithoutOriginal'
  | 'substitutionWithoutMissing'
  | 'missingKitUnnamed';

export type ChapterFault = {
  code: ChapterFaultCode;
  /** `refused` is what cannot be stored; a `warning` never keeps anybody from saving */
  severity: 'refused' | 'warning';
  chapterId: string;
  otherId?: string;
  message: string;
};

/** A chapter below this is more likely a slip of the finger than something to watch (common practice, no source). */
export const shortChapterMs = 1000;

export function sortChapters<C extends { startMs: number; endMs: number }>(chapters: readonly C[]): C[] {
  return chapters.toSorted((a, b) => a.startMs - b.startMs || a.endMs - b.endMs);
}

/**
 * The faults in a recording's chapters, in order.
 * Source: W3C WebVTT, "WebVTT file using chapter title text": chapters follow one another or nest completely; here they never nest.
 * @param chapters in any order; times in milliseconds
 * @param durationMs length of the recording, or null while it is not known
 */
export function chapterFaults(chapters: readonly Chapter[], durationMs: number | null): ChapterFault[] {
  const seen = new Set<string>();
  let furthest: Chapter | undefined;
  return sortChapters(chapters).flatMap((chapter) => {
    const before = furthest;
    if (!furthest || chapter.endMs > furthest.endMs) furthest = chapter;
    const known = seen.has(chapter.id);
    seen.add(chapter.id);
    return [
      ...placeFaults(chapter, before, durationMs),
      ...(known ? [fault('sameId', 'refused', chapter, 'is in the list twice.')] : []),
      ...linkFaults(chapter),
    ];
  });
}

/** Whether these chapters can be stored; warnings don't count. */
export function canBeSaved(faults: readonly ChapterFault[]): boolean {
  return faults.every(({ severity }) => severity === 'warning');
}

function fault(
  code: ChapterFaultCode,
  severity: ChapterFault['severity'],
  chapter: Chapter,
  what: string,
  other?: Chapter,
): ChapterFault {
  return {
    code,
    severity,
    chapterId: chapter.id,
    ...(other ? { otherId: other.id } : {}),
    message: `“${chapter.title}” at ${formatMsWithTenths(chapter.startMs)} ${what}`,
  };
}

function placeFaults(chapter: Chapter, before: Chapter | undefined, durationMs: number | null): ChapterFault[] {
  const lasts = chapter.endMs - chapter.startMs;
  const faults: ChapterFault[] = [];
  if (lasts <= 0) faults.push(fault('noLength', 'refused', chapter, 'ends before it starts.'));
  else if (lasts < shortChapterMs)
    faults.push(fault('tooShort', 'warning', chapter, `lasts only ${(lasts / 1000).toFixed(1)} s.`));
  if (durationMs !== null && chapter.endMs > durationMs)
    faults.push(
      fault('pastEnd', 'refused', chapter, `goes on after the recording's end at ${formatMsWithTenths(durationMs)}.`),
    );
  if (before && chapter.startMs < before.endMs)
    faults.push(
      fault(
        'overlap',
        'refused',
        chapter,
        `starts before “${before.title}” ends at ${formatMsWithTenths(before.endMs)}.`,
        before,
      ),
    );
  return faults;
}

/** What a member would miss: a demo that nobody finds by its movement, a substitution that no line of a plan leads to. */
function linkFaults(chapter: Chapter): ChapterFault[] {
  const faults: ChapterFault[] = [];
  if (chapter.kind === 'demo' && !chapter.movementId)
    faults.push(fault('demoWithoutMovement', 'warning', chapter, 'shows no movement yet, so nobody finds it by name.'));
  if (chapter.kind !== 'substitution') return faults;
  if (!chapter.movementId)
    faults.push(fault('substitutionWithoutMovement', 'warning', chapter, 'does not say which movement it shows.'));
  if (!chapter.standsInForMovementId)
    faults.push(
      fault('substitutionWithoutOriginal', 'warning', chapter, 'does not say which movement it stands in for.'),
    );
  if (!chapter.missing)
    faults.push(
      fault(
        'substitutionWithoutMissing',
        'warning',
        chapter,
        'does not say what it does without: kit, space or ability.',
      ),
    );
  if (chapter.missing === 'kit' && !chapter.missingKitItemId)
    faults.push(fault('missingKitUnnamed', 'warning', chapter, 'does not say which kit it does without.'));
  return faults;
}
