import { QueryTypes } from 'sequelize';
import { MediaFault } from '../media/mediaFault';
import type { Log } from '../middleware/log';
import { database, inTransaction } from '../models/database';
import type { Handler } from './handler';

/** What a job that a stopping worker let go of ended with. */
export const stoppedMessage = 'The worker stops.';

type Exhausted = { name: string; key: string | null; payload: unknown; lastError: string | null };

/**
 * Ends the jobs that were tried as often as they may: what they were for is told why, and they go. A job that no worker
 * ended itself was lost with its worker each time; one that was let go of by a stopping worker gets another try.
 */
export async function clearExhausted(handlers: readonly Handler[], log: Log): Promise<void> {
  const endings = new Map(
    handlers.flatMap(({ definition, givenUp }) => (givenUp ? [[definition.name, givenUp] as const] : [])),
  );
  if (endings.size === 0) return;
  for (const id of await exhaustedIds([...endings.keys()]))
    await inTransaction(async () => {
      const job = await take(id);
      // without a key it was followed by a new one while it ran
      if (!job || job.key === null) return;
      log.warn({ job: job.name, jobId: id, lastError: job.lastError?.slice(0, 500) }, 'job given up');
      await endings.get(job.name)?.(
        job.payload,
        job.lastError ? new Error(job.lastError) : new MediaFault('lostWorker'),
      );
    });
}

/**
 * Frees what a worker that has stopped still holds. The queue itself notes the end of a job without waiting for it, and
 * loses the note when the process ends; a try that was stopped is not counted.
 */
export async function giveBack(workerIds: string[]): Promise<void> {
  if (workerIds.length === 0) return;
  await database().query(
    `update graphile_worker._private_jobs
     set locked_by = null, locked_at = null, run_at = now(), attempts = greatest(0, attempts - 1), last_error = :stopped
     where locked_by in (:workerIds)`,
    { replacements: { workerIds, stopped: stoppedMessage } },
  );
}

async function exhaustedIds(names: string[]): Promise<string[]> {
  await database().query(
    `update graphile_worker._private_jobs set attempts = attempts - 1, run_at = now()
     where attempts >= max_attempts and locked_at is null and key is not null and last_error like :stopped`,
    { replacements: { stopped: `%${stoppedMessage}%` } },
  );
  const rows = await database().query<{ id: string }>(
    `select id from graphile_worker.jobs
     where attempts >= max_attempts and locked_at is null and task_identifier in (:names) limit 50`,
    { replacements: { names }, type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.id);
}

/** Takes the job out of the queue, unless somebody asked for it anew in the meantime. */
async function take(id: string): Promise<Exhausted | null> {
  const [job] = await database().query<Exhausted>(
    `delete from graphile_worker._private_jobs j using graphile_worker._private_tasks t
     where t.id = j.task_id and j.id = :id and j.attempts >= j.max_attempts and j.locked_at is null
     returning t.identifier as name, j.key, j.payload, j.last_error as "lastError"`,
    { replacements: { id }, type: QueryTypes.SELECT },
  );
  return job ?? null;
}
