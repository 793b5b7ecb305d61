import { EventEmitter } from 'node:events';
import { Logger, makeWorkerUtils, type Runner, run, type TaskList, type WorkerEvents } from 'graphile-worker';
import pg from 'pg';
import type { Log } from '../middleware/log';
import { clearExhausted, stoppedMessage } from './exhausted';
import type { Handler } from './handler';
import { keepBeating } from './heartbeat';

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
  const stopping = new AbortController();
  const workerIds = new Set<string>();
  const pool = new pg.Pool({ connectionString: databaseUrl, max: jobsAtOnce + 3 });
  pool.on('error', (error) => log.warn({ err: error }, 'queue pool'));
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

  // listened to before the first worker exists
  const events: WorkerEvents = new EventEmitter();
  events.on('worker:create', ({ worker }) => workerIds.add(worker.workerId));
  events.on('worker:stop', ({ worker }) => workerIds.delete(worker.workerId));
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
