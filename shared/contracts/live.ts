import { z } from 'zod';
import { Id } from '../domain/values';
import { makingSteps, recordingStates, stepStates } from '../domain/words';
import { endpoint } from './endpoint';

/** What is told while it happens; a page that hears it asks again for what it shows. */
export const LiveEvent = z.discriminatedUnion('type', [
  z.object({
    type: z.literal('step'),
    recordingId: Id,
    step: z.enum(makingSteps),
    state: z.enum(stepStates),
    percent: z.int(),
  }),
  z.object({ type: z.literal('recording'), recordingId: Id, state: z.enum(recordingStates) }),
  z.object({ type: z.literal('removed'), recordingId: Id }),
  z.object({
    type: z.literal('saved'),
    recordingId: Id,
    document: z.enum(['chapters', 'cues', 'captions']),
    version: z.int(),
    by: Id,
  }),
]);
export type LiveEvent = z.infer<typeof LiveEvent>;

export const live = endpoint({
  method: 'get',
  path: '/teams/:team/live',
  may: 'readDrafts',
  summary: 'Server-sent events: progress of making, and saves by others',
  answers: 'text/event-stream',
  response: LiveEvent,
});
