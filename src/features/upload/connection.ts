import { ApiError } from '../../lib/api';
import { pause, triesInAll, waitMs } from './backOff';
import { LostPart } from './putPart';

/** Whether the device says that it has no connection; `true` may still mean a dead one. */
export const isOffline = () => navigator.onLine === false;

/** Resolves when the device says that it has a connection. @throws the signal's reason when it is aborted first */
export function online(signal: AbortSignal): Promise<void> {
  return new Promise((resolve, reject) => {
    signal.throwIfAborted();
    if (!isOffline()) return resolve();
    const done = () => {
      window.removeEventListener('online', done);
      signal.removeEventListener('abort', done);
      if (signal.aborted) reject(signal.reason);
      else resolve();
    };
    window.addEventListener('online', done);
    signal.addEventListener('abort', done);
  });
}

const passing = new Set(['offline', 'broken', 'unavailable', 'tooOften']);

/** Whether the same request may end well a little later. */
export const isPassing = (error: unknown): boolean =>
  error instanceof LostPart || (error instanceof ApiError && passing.has(error.code));

/** Whether it was the connection, not an answer. */
export const isLostConnection = (error: unknown): boolean =>
  (error instanceof ApiError && error.code === 'offline') || (error instanceof LostPart && error.status === 0);

/**
 * Does something until it ends well: five tries with growing pauses. Time without a connection counts as none of them.
 * @throws the last error, one that no further try can mend, or the signal's reason
 */
export async function untilDone<T>(attempt: () => Promise<T>, signal: AbortSignal): Promise<T> {
  for (let failed = 0; ; ) {
    await online(signal);
    try {
      return await attempt();
    } catch (error) {
      signal.throwIfAborted();
      if (!isPassing(error)) throw error;
      if (isOffline()) continue;
      failed += 1;
      if (failed >= triesInAll) throw error;
      const asked = error instanceof ApiError ? (error.retryAfterSeconds ?? 0) * 1000 : 0;
      await pause(Math.max(asked, waitMs(failed)), signal);
    }
  }
}
