// @ts-check

/**
 * Runs one step; where it takes longer than a second, says what it is, that it goes on, and how long it took.
 * @template T
 * @param {string} what
 * @param {() => T | Promise<T>} work
 * @param {(line: string) => void} [say]
 * @returns {Promise<T>}
 */
export async function step(what, work, say = (line) => console.log(line)) {
  const began = Date.now();
  const seconds = () => Math.round((Date.now() - began) / 1000);
  const first = setTimeout(() => say(`  ${what} …`), 1000);
  const again = setInterval(() => say(`  ${what} … ${seconds()} s so far`), 20_000);
  try {
    return await work();
  } finally {
    clearTimeout(first);
    clearInterval(again);
    if (Date.now() - began >= 1000) say(`  ${what}: ${seconds()} s`);
  }
}
