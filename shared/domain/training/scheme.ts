import { z } from 'zod';

/** How a block is done. The rest after the last interval is said, never assumed: sources disagree on it. */

const seconds = z.int().min(1).max(7200);
const minutes = z.number().positive().max(180);
const rounds = z.int().min(1).max(100);

export const Scheme = z.discriminatedUnion('type', [
  z.object({ type: z.literal('amrap'), minutes }),
  z.object({ type: z.literal('emom'), minutes, everySeconds: seconds.default(60) }),
  z.object({
    type: z.literal('intervals'),
    rounds,
    workSeconds: seconds,
    restSeconds: z.int().min(0).max(7200),
    restAfterLast: z.boolean().default(false),
  }),
  z.object({ type: z.literal('roundsForTime'), rounds, capMinutes: minutes.nullable().default(null) }),
  z.object({ type: z.literal('sets'), sets: rounds, restSeconds: seconds.nullable().default(null) }),
  z.object({ type: z.literal('holds'), rounds }),
  z.object({ type: z.literal('quality'), rounds: rounds.nullable().default(null), minutes: minutes.nullable().default(null) }),
]);
export type Scheme = z.infer<typeof Scheme>;
