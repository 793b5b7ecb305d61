import { z } from 'zod';
import { database } from '../models/database';

/** A job's name and payload are a contract between whoever asks and whichever worker, old or new, takes it. */
export type JobDefinition<P extends z.ZodObject = z.ZodObject> = {
  name: string;
  payload: P;
  /** jobs with the same key are one job; a second request replaces the first while it waits */
  key: (payload: z.infer<P>) => string;
  /** lower runs first */
  priority: number;
  attempts: number;
};

function job<P extends z.ZodObject>(definition: JobDefinition<P>): JobDefinition<P> {
  return definition;
}

const ofRecording = z.object({ teamId: z.uuid(), recordingId: z.uuid() });
type OfRecording = z.infer<typeof ofRecording>;
const keyOf = (name: string) => (payload: OfRecording) => `${name}:${payload.recordingId}`;

/** probe, then it asks for the rest */
export const probeRecording = job({
  name: 'probeRecording',
  payload: ofRecording,
  key: keyOf('probe'),
  priority: 0,
  attempts: 5,
});
export const makePoster = job({
  name: 'makePoster',
  payload: ofRecording,
  key: keyOf('poster'),
  priority: 1,
  attempts: 5,
});
export const makePlayback = job({
  name: 'makePlayback',
  payload: ofRecording,
  key: keyOf('playback'),
  priority: 2,
  attempts: 5,
});
export const makeChapterPictures = job({
  name: 'makeChapterPictures',
  payload: ofRecording,
  key: keyOf('chapterPictures'),
  priority: 3,
  attempts: 5,
});
/** removes everything of a recording from the store; the rows are gone already */
export const removeObjects = job({
  name: 'removeObjects',
  payload: z.object({ teamId: z.uuid(), recordingId: z.uuid(), prefixes: z.array(z.string().min(10)).min(1) }),
  key: (payload) => `removeObjects:${payload.recordingId}`,
  priority: 10,
  attempts: 20,
});
export const drawDemoRecording = job({
  name: 'drawDemoRecording',
  payload: ofRecording.extend({ script: z.string() }),
  key: (payload) => `drawDemo:${payload.recordingId}`,
  priority: 5,
  attempts: 5,
});
export const sendMail = job({
  name: 'sendMail',
  payload: z.object({ id: z.uuid(), to: z.string(), subject: z.string(), text: z.string() }),
  key: (payload) => `mail:${payload.id}`,
  priority: 0,
  attempts: 12,
});

/**
 * Asks for a job, in the surrounding transaction: it exists only if that commits.
 * A request with a key that waits already replaces it; one that runs is followed by a new one.
 */
export async function enqueue<P extends z.ZodObject>(definition: JobDefinition<P>, payload: z.input<P>): Promise<void> {
  const parsed = definition.payload.parse(payload);
  await database().query(
    `select graphile_worker.add_job(:name, payload := :payload::json, job_key := :key, priority := :priority, max_attempts := :attempts)`,
    {
      replacements: {
        name: definition.name,
        payload: JSON.stringify(parsed),
        key: definition.key(parsed as z.infer<P>),
        priority: definition.priority,
        attempts: definition.attempts,
      },
    },
  );
}
