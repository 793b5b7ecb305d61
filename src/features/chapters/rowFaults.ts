import type { Chapter } from '../../../shared/domain/chapters/chapter';
import { chapterFaults } from '../../../shared/domain/chapters/chapterRules';
import { formatMsWithTenths } from '../../../shared/domain/timecode';

export type RowFault = { severity: 'refused' | 'warning'; message: string; said: string };

/**
 * What is wrong with each chapter, in the row's own words: there its title and time are said already.
 * @param blockIds blocks of the recording's session, or null while they are not known
 */
export function rowFaults(
  chapters: readonly Chapter[],
  durationMs: number | null,
  blockIds: ReadonlySet<string> | null,
): Map<string, RowFault[]> {
  const byId = new Map(chapters.map((chapter) => [chapter.id, chapter]));
  const rows = new Map<string, RowFault[]>();
  const add = (id: string, fault: RowFault) => rows.set(id, [...(rows.get(id) ?? []), fault]);
  for (const { chapterId, severity, message } of chapterFaults(chapters, durationMs)) {
    const chapter = byId.get(chapterId);
    const lead = chapter ? `“${chapter.title}” at ${formatMsWithTenths(chapter.startMs)} ` : '';
    add(chapterId, {
      severity,
      message: sentence(message.startsWith(lead) ? message.slice(lead.length) : message),
      said: message,
    });
  }
  for (const { id, title, blockId } of chapters)
    if (blockId !== null && blockIds && !blockIds.has(blockId)) {
      const message = 'Shows a block of another session. Choose one of this session, or none.';
      add(id, { severity: 'refused', message, said: `“${title}”: ${message}` });
    }
  return rows;
}

/** Why chapters with these faults cannot be saved, or null. */
export function refusalOf(faults: ReadonlyMap<string, RowFault[]>): string | null {
  for (const row of faults.values()) {
    const refused = row.find(({ severity }) => severity === 'refused');
    if (refused) return refused.said;
  }
  return null;
}

const sentence = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
