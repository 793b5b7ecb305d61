import { QueryTypes } from 'sequelize';
import { allHandlers } from '../../server/jobs/handlers/all';
import { type Queue, startQueue } from '../../server/jobs/queue';
import { openLog } from '../../server/middleware/log';
import { database } from '../../server/models/database';
import type { Api } from './api';

/** The worker's queue in this process, on the database and the store of an API that runs. */
export const startWorker = (api: Api): Promise<Queue> =>
  startQueue(api.config.databaseUrl, allHandlers(api.config), 2, openLog('fatal', 'worker'));

/** Asks again and again until something holds. @throws Error after the time given */
export async function until<T>(
  what: string,
  ask: () => Promise<T | undefined | null | false>,
  ms = 60_000,
): Promise<T> {
  const end = Date.now() + ms;
  for (;;) {
    const answer = await ask();
    if (answer) return answer;
    if (Date.now() > end) throw new Error(`Not within ${ms} ms: ${what}.`);
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

/** Waits until the queue has nothing left to do. */
export const untilIdle = (): Promise<boolean> =>
  until('an empty queue', async () => {
    const [row] = await database().query<{ count: number }>('select count(*)::int as count from graphile_worker.jobs', {
      type: QueryTypes.SELECT,
    });
    return row?.count === 0;
  });
