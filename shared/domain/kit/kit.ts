import { z } from 'zod';
import { Id } from '../values';

/** One way to meet a need: so many of an item, at least so heavy where the load matters. */
export const KitOption = z.object({
  kitItemId: Id,
  count: z.int().min(1).max(50).default(1),
  /** the least load of each, in kg; null where any will do */
  minLoadKg: z.number().positive().max(500).nullable().default(null),
});
export type KitOption = z.infer<typeof KitOption>;

/** A need is met by any one of its options ("a bar to hang from, or rings"). */
export const KitNeed = z.object({ anyOf: z.array(KitOption).min(1).max(10) });
export type KitNeed = z.infer<typeof KitNeed>;

/** What a member has of one item; the loads may be fewer than the count when some weights are unknown. */
export const OwnedKit = z.object({
  kitItemId: Id,
  count: z.int().min(1).max(50),
  loadsKg: z.array(z.number().positive().max(500)).max(50).default([]),
});
export type OwnedKit = z.infer<typeof OwnedKit>;
