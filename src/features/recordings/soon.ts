/** Long enough to gather what arrives together, short enough not to be noticed. */
const gatherMs = 300;

/** Does something once for many askings in quick succession. */
export function soon(task: () => unknown): { ask: () => void; stop: () => void } {
  let timer: ReturnType<typeof setTimeout> | null = null;
  return {
    ask: () => {
      timer ??= setTimeout(() => {
        timer = null;
        void task();
      }, gatherMs);
    },
    stop: () => {
      if (timer !== null) clearTimeout(timer);
    },
  };
}
