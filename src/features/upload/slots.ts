/** A few places that many want; whoever came into the queue first goes first. */
export type Slots = {
  /**
   * Holds a place while something is done.
   * @param order the smaller one goes first
   * @throws the signal's reason while it waits, or what the task throws
   */
  hold<T>(order: number, signal: AbortSignal, task: () => Promise<T>): Promise<T>;
};

export function openSlots(count: number): Slots {
  let free = count;
  let queue: { order: number; go: () => void }[] = [];

  const next = () => {
    const first = queue.reduce<(typeof queue)[number] | null>(
      (best, one) => (best === null || one.order < best.order ? one : best),
      null,
    );
    if (!first || free === 0) return;
    queue = queue.filter((one) => one !== first);
    free -= 1;
    first.go();
  };

  const take = (order: number, signal: AbortSignal) =>
    new Promise<void>((resolve, reject) => {
      signal.throwIfAborted();
      const leave = () => {
        queue = queue.filter((one) => one !== place);
        reject(signal.reason);
      };
      const place = {
        order,
        go: () => {
          signal.removeEventListener('abort', leave);
          resolve();
        },
      };
      signal.addEventListener('abort', leave, { once: true });
      queue = [...queue, place];
      next();
    });

  return {
    async hold(order, signal, task) {
      await take(order, signal);
      try {
        return await task();
      } finally {
        free += 1;
        next();
      }
    },
  };
}
