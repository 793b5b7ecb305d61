import { mkdtemp, readdir, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

const prefix = 'tapeline-making-';

/** A folder for one run of one job, open to nobody else; it goes with everything in it, however the run ends. */
export async function inPrivateFolder<T>(work: (folder: string) => Promise<T>): Promise<T> {
  // mkdtemp makes the folder with mode 0700; the name says which process it belongs to
  const folder = await mkdtemp(join(tmpdir(), `${prefix}${process.pid}-`));
  try {
    return await work(folder);
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

/** Removes what workers of this machine left that were killed. */
export async function sweepPrivateFolders(): Promise<void> {
  for (const name of await readdir(tmpdir())) {
    const owner = /^tapeline-making-(\d+)-/.exec(name)?.[1];
    if (owner === undefined || isAlive(Number(owner))) continue;
    // another user's folder is for that user's worker to remove
    await rm(join(tmpdir(), name), { recursive: true, force: true }).catch(() => undefined);
  }
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as { code?: string }).code === 'EPERM';
  }
}
