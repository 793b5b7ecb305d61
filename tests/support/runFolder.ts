import { mkdirSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { isAlive, ownerOf, takeLock } from '../../server/start/lock.mjs';
import { stopCluster } from '../../server/start/postgres/cluster';
import { placedElsewhere } from '../../server/start/postgres/placement';

/** Below the local data, where git and the builds do not look. */
const parent = path.resolve('storage/data');

/**
 * A folder of this run alone, for clusters, buckets and mail; whatever runs left that were killed is ended and removed
 * first, so that two at once never meet and nothing piles up.
 */
export async function openRunFolder(purpose: string): Promise<{ folder: string; remove(): Promise<void> }> {
  mkdirSync(parent, { recursive: true });
  await sweepDeadRuns();
  const folder = path.join(parent, `test-${purpose}-${process.pid}-${Date.now().toString(36)}`);
  mkdirSync(folder, { mode: 0o755 });
  takeLock(path.join(folder, 'run'));
  return { folder, remove: () => removeRun(folder) };
}

export async function sweepDeadRuns() {
  for (const name of readdirSync(parent).filter((entry) => entry.startsWith('test-'))) {
    const owner = ownerOf(path.join(parent, name, 'run'));
    // without a name it was made a moment ago, or was cut off: a folder's own time tells
    if (owner ? isAlive(owner) : isYoung(name)) continue;
    await removeRun(path.join(parent, name));
  }
}

async function removeRun(folder: string) {
  const outside = placedElsewhere(folder);
  await stopCluster(outside ?? path.join(folder, 'postgres'));
  if (outside) rmSync(path.dirname(outside), { recursive: true, force: true });
  rmSync(folder, { recursive: true, force: true });
}

function isYoung(name: string) {
  const made = Number.parseInt(name.split('-').at(-1) ?? '', 36);
  return Date.now() - made < 60_000;
}
