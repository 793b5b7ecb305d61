import { z } from 'zod';
import { longText, shortText } from '../values';

/** A caution: one bold sentence that says what to do, and a plain one that says more. */
export const Caution = z.object({
  say: shortText(160),
  more: longText(300).default(''),
});
export type Caution = z.infer<typeof Caution>;
