import { z } from 'zod';
import { Dose } from '../training/dose';

/** How the dose of a movement becomes the dose of what is done instead. */
export const DoseRule = z.discriminatedUnion('type', [
  z.object({ type: z.literal('same') }),
  z.object({ type: z.literal('samePerSide') }),
  z.object({
    type: z.literal('times'),
    factor: z.number().positive().max(20),
    cap: z.number().positive().max(10_000).nullable().default(null),
  }),
  z.object({
    type: z.literal('secondsForReps'),
    secondsPerRep: z.number().positive().max(60),
    cap: z.number().positive().max(3600).nullable().default(null),
  }),
  z.object({ type: z.literal('fixed'), dose: Dose }),
]);
export type DoseRule = z.infer<typeof DoseRule>;
