import type { Opening } from './house';

/**
 * Ends the house on Ctrl-C, on SIGTERM, when the terminal goes, and when the process that started this one is gone.
 * @returns whether an end was asked for
 */
export function endOnSignal(opening: Opening): () => boolean {
  let asked = false;
  const end = async () => {
    if (asked) return;
    asked = true;
    console.log('Ending …');
    await opening.close();
    process.exit(0);
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, end);
  if (process.connected) process.once('disconnect', end);
  return () => asked;
}
