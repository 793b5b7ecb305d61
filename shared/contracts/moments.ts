import { z } from 'zod';
import { Id, Ms } from '../domain/values';
import { chapterKinds, missingThings } from '../domain/words';

export const NamedMovement = z.object({ id: Id, name: z.string() });

/** Where a search or a link lands: a recording and a time, with all that a row needs to show it. */
export const Moment = z.object({
  recordingId: Id,
  chapterId: Id,
  startMs: Ms,
  endMs: Ms,
  kind: z.enum(chapterKinds),
  title: z.string(),
  movement: NamedMovement.nullable(),
  standsInFor: NamedMovement.nullable(),
  missing: z.enum(missingThings).nullable(),
  /** "no rope": what a substitution does without, in words */
  missingText: z.string().nullable(),
  session: z.object({ id: Id, date: z.string(), title: z.string() }).nullable(),
  coach: z.string().nullable(),
  /** signed and short-lived; null while there is none */
  pictureUrl: z.string().nullable(),
});
export type Moment = z.infer<typeof Moment>;
