import { z } from 'zod';
import { shortText } from '../values';

/** A caution: one bold sentence that says what to do, and a plain one that says more. */
export const Caution = z.object({
  say: shortText(160),
  more: z.string().trim().max(300, 'At most 300 characters.').default(''),
});
export type Caution = z.infer<typeof Caution>;
