import { z } from 'zod';

/** How much of a movement is done: "10 reps", "6 / side", "30 s", "200 m", "12 cal", with a load and a tempo where they matter. */

export const doseUnits = ['reps', 'seconds', 'metres', 'calories'] as const;
export type DoseUnit = (typeof doseUnits)[number];

export const Load = z.object({
  kg: z.number().positive().max(1000),
  /** as the coach typed it, "53 lb", so that nobody has to read a converted figure */
  typed: z.string().max(20),
});
export type Load = z.infer<typeof Load>;

export const Dose = z.object({
  amount: z.number().positive().max(10_000),
  /** the upper end of "8 to 10" */
  amountTo: z.number().positive().max(10_000).nullable().default(null),
  unit: z.enum(doseUnits),
  perSide: z.boolean().default(false),
  load: Load.nullable().default(null),
  /** lowering, pause, rising, pause: "3-0-1-0" */
  tempo: z
    .string()
    .regex(/^\d{1,2}-\d{1,2}-\d{1,2}-\d{1,2}$/, 'Write a tempo as four numbers: 3-0-1-0.')
    .nullable()
    .default(null),
});
export type Dose = z.infer<typeof Dose>;
