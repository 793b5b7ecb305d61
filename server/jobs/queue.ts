import { EventEmitter } from 'node:events';
import { Logger, makeWorkerUtils, type Runner, run, type TaskList, type WorkerEvents } from 'graphile-worker';
import pg from 'pg';
import type { Log } from '../middleware/log';
import { clearExhausted, giveBack, stoppedMessage } from './exhausted';
import type { Handler } from './handler';
import { keepBeating } from './heartbeat';
import { sweepPrivateFolders } from './privateFolder';

export type Queue = { stop(): Promise<void> };

/**
 * Takes jobs until it is stopped. Stopping aborts what runs; an aborted job goes back to the queue and is taken up by
 * whichever worker comes next.
 */
export async function startQueue(
  databaseUrl: string,
  handlers: readonly Handler[],
  jobsAtOnce: number,
  log: Log,
): Promise<Queue> {
  await sweepPrivateFolders();
  const stopping = new AbortController();
  const workerIds = new Set<string>();
  const pool = new pg.Pool({ connectionString: databaseUrl, max: jobsAtOnce + 3 });
  const onError = (error: Error) => log.warn({ err: error }, 'queue pool');
  pool.on('error', onError);
  pool.on('connect', (client) => client.on('error', onError));
  const logger = quiet(log);
  const utils = await makeWorkerUtils({ pgPool: pool, logger });

  const taskList: TaskList = Object.fromEntries(
    handlers.map(({ definition, run: work }) => [
      definition.name,
      async (payload, { job }) => {
        const started = Date.now();
        const about = { job: definition.name, jobId: job.id, attempt: job.attempts };
        try {
          await work(payload, { signal: stopping.signal, log, attempt: job.attempts, maxAttempts: job.max_attempts });
          log.info({ ...about, ms: Date.now() - started }, 'job done');
        } catch (error) {
          if (!stopping.signal.aborted) log.error({ ...about, err: error, ms: Date.now() - started }, 'job failed');
          throw error;
        }
      },
    ]),
  );

  // listened to before the first worker exists; jobs are locked in the name of the pool, not of its workers
  const events: WorkerEvents = new EventEmitter();
  events.on('pool:create', ({ workerPool }) => workerIds.add(workerPool.id));
  const runner: Runner = await run({
    events,
    pgPool: pool,
    taskList,
    concurrency: jobsAtOnce,
    noHandleSignals: true,
    pollInterval: 1000,
    logger,
  });
  const stopBeating = keepBeating(
    () => [...workerIds],
    utils,
    log,
    () => clearExhausted(handlers, log),
  );

  return {
    async stop() {
      stopping.abort(new Error(stoppedMessage));
      await runner.stop().catch((error: unknown) => log.warn({ err: error }, 'queue stopped hard'));
      await giveBack([...workerIds]);
      await stopBeating();
      await utils.release();
      await pool.end();
    },
  };
}

/** The queue's own lines below a warning say nothing that ours don't. */
function quiet(log: Log): Logger {
  return new Logger(() => (level, message) => {
    if (level === 'error' || level === 'warning') log.warn({ queue: message.slice(0, 500) }, 'queue');
  });
}
