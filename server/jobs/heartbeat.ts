import type { WorkerUtils } from 'graphile-worker';
import { QueryTypes } from 'sequelize';
import type { Log } from '../middleware/log';
import { database } from '../models/database';

const beatMs = 5_000;
/** a worker that was not heard of for so long is dead: its jobs go to others within the minute */
const deadAfterSeconds = 30;

/**
 * A worker that is killed keeps its jobs locked for hours. So each one says that it lives, and each one frees what
 * those hold that no longer do.
 * @param then done after each beat, when the dead workers' jobs are free
 * @returns the end of it
 */
export function keepBeating(
  workerIds: () => string[],
  utils: WorkerUtils,
  log: Log,
  then: () => Promise<void>,
): () => Promise<void> {
  let running: Promise<void> = Promise.resolve();
  const beat = async () => {
    try {
      for (const id of workerIds())
        await database().query(
          'insert into worker_heartbeats (worker_id, seen_at) values (:id, now()) on conflict (worker_id) do update set seen_at = now()',
          { replacements: { id } },
        );
      await freeDead(utils, log);
      await then();
    } catch (error) {
      log.warn({ err: error }, 'heartbeat failed');
    }
  };
  running = beat();
  const timer = setInterval(() => {
    running = running.then(beat);
  }, beatMs);
  return async () => {
    clearInterval(timer);
    await running;
    const ids = workerIds();
    if (ids.length > 0)
      await database()
        .query('delete from worker_heartbeats where worker_id in (:ids)', { replacements: { ids } })
        .catch(() => undefined);
  };
}

async function freeDead(utils: WorkerUtils, log: Log): Promise<void> {
  const dead = await deadWorkers();
  if (dead.length === 0) return;
  await utils.forceUnlockWorkers(dead);
  await database().query('delete from worker_heartbeats where worker_id in (:dead)', { replacements: { dead } });
  log.warn({ workers: dead }, 'freed the jobs of workers that are gone');
}

/** Workers that hold a job, or once said that they live, and were not heard of since. */
async function deadWorkers(): Promise<string[]> {
  const rows = await database().query<{ id: string }>(
    `select distinct id from (
       select locked_by as id from graphile_worker.jobs where locked_by is not null and locked_at < now() - make_interval(secs => :seconds)
       union select worker_id from worker_heartbeats where seen_at < now() - make_interval(secs => :seconds)
     ) known
     where not exists (select 1 from worker_heartbeats h where h.worker_id = known.id and h.seen_at >= now() - make_interval(secs => :seconds))`,
    { replacements: { seconds: deadAfterSeconds }, type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.id);
}
