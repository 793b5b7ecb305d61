import type { z } from 'zod';
import type { Log } from '../middleware/log';
import type { JobDefinition } from './definitions';

/** What a handler gets beside its payload. */
export type JobContext = {
  /** aborted when the worker stops: end what was started, leave nothing half-written, throw */
  signal: AbortSignal;
  log: Log;
  /** counted from 1; after `maxAttempts` the queue gives up */
  attempt: number;
  maxAttempts: number;
};

export type Handler = {
  definition: JobDefinition;
  run: (payload: unknown, context: JobContext) => Promise<void>;
  /** called in a transaction once the queue has tried often enough; the job is gone with it */
  givenUp: ((payload: unknown, error: unknown) => Promise<void>) | undefined;
};

/** Joins a definition with what the worker does for it; the payload is parsed again, as it may come from another version. */
export function handle<P extends z.ZodObject>(
  definition: JobDefinition<P>,
  run: (payload: z.infer<P>, context: JobContext) => Promise<void>,
  givenUp?: (payload: z.infer<P>, error: unknown) => Promise<void>,
): Handler {
  return {
    definition: definition as unknown as JobDefinition,
    run: (payload, context) => run(definition.payload.parse(payload) as z.infer<P>, context),
    givenUp: givenUp && ((payload, error) => givenUp(definition.payload.parse(payload) as z.infer<P>, error)),
  };
}
