import { z } from 'zod';
import { Id, longText, Ms, shortText } from '../values';
import { chapterKinds, missingThings } from '../words';

/** A marked stretch of a recording. Chapters are in order, never overlap and never nest; gaps are allowed. */
export const Chapter = z.object({
  /** made by whoever starts the chapter, so that undo, pictures and links keep their hold on it */
  id: Id,
  startMs: Ms,
  endMs: Ms,
  kind: z.enum(chapterKinds),
  title: shortText(120),
  note: longText(1000).default(''),
  blockId: Id.nullable().default(null),
  movementId: Id.nullable().default(null),
  /** for a substitution: the movement that it stands in for */
  standsInForMovementId: Id.nullable().default(null),
  /** for a substitution: what it does without */
  missing: z.enum(missingThings).nullable().default(null),
  missingKitItemId: Id.nullable().default(null),
});
export type Chapter = z.infer<typeof Chapter>;
