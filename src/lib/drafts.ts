import { z } from 'zod';
import { Instant, Version } from '../../shared/domain/values';

/** Changes that were not saved yet, with the version that they were made on. */
export type Draft<T> = { version: number; base: T; content: T; at: string };

export type DraftPlace<T> = {
  read(): Draft<T> | null;
  write(draft: Draft<T>): void;
  remove(): void;
};

/**
 * A place in this browser for one person's unsaved changes to one document. Without storage (private windows, a full disk)
 * they last as long as the page.
 * @param content checks what is read back: an older build may have written it
 */
export function draftPlace<T>(
  of: { person: string; team: string; document: string; recording: string },
  content: z.ZodType<T>,
): DraftPlace<T> {
  const key = ['tapeline.draft', of.person, of.team, of.document, of.recording].join('.');
  const Kept = z.object({ version: Version, base: content, content, at: Instant });
  const attempt = <R>(what: () => R): R | null => {
    try {
      return what();
    } catch {
      return null;
    }
  };
  return {
    read: () => {
      const text = attempt(() => localStorage.getItem(key));
      const kept = Kept.safeParse(text === null ? null : attempt(() => JSON.parse(text)));
      return kept.success ? kept.data : null;
    },
    write: (draft) => void attempt(() => localStorage.setItem(key, JSON.stringify(draft))),
    remove: () => void attempt(() => localStorage.removeItem(key)),
  };
}
