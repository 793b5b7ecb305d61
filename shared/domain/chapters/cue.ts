import { z } from 'zod';
import { Id, Ms, shortText } from '../values';
import { cueKinds } from '../words';

/** A coaching cue: a short point of performance pinned to a moment of a recording. */
export const Cue = z.object({
  id: Id,
  atMs: Ms,
  kind: z.enum(cueKinds).default('go'),
  text: shortText(140),
  movementId: Id.nullable().default(null),
});
export type Cue = z.infer<typeof Cue>;
