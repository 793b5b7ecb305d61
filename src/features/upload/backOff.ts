/** How often something is tried before a person is asked. */
export const triesInAll = 5;

const firstMs = 1000;
const longestMs = 30_000;

/**
 * How long to wait before the next try: twice as long each time, by chance between half and all of it, so that many
 * pages that lost the same server don't come back at once.
 * @param failed tries that failed, from 1
 * @param chance between 0 and 1
 */
export function waitMs(failed: number, chance = Math.random()): number {
  const whole = Math.min(longestMs, firstMs * 2 ** (failed - 1));
  return whole * (0.5 + chance / 2);
}

/** @throws the signal's reason when it is aborted first */
export function pause(ms: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve, reject) => {
    signal.throwIfAborted();
    const stop = () => {
      clearTimeout(timer);
      reject(signal.reason);
    };
    const timer = setTimeout(() => {
      signal.removeEventListener('abort', stop);
      resolve();
    }, ms);
    signal.addEventListener('abort', stop, { once: true });
  });
}
