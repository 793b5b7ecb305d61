import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { canEnter, type ServerUser } from './serverUser';

/** Where a cluster goes that its user cannot reach inside the clone; in the environment for tests. */
const elsewhere = () => process.env.TAPELINE_CLUSTERS ?? '/var/lib';

/**
 * The folder for the cluster: `postgres` below the data folder, or one outside where the server's user cannot enter it
 * (a clone in root's home). A note beside says where; a second clone gets another folder.
 */
export function placeCluster(dataFolder: string, user: ServerUser): string {
  const here = path.resolve(dataFolder, 'postgres');
  mkdirSync(dataFolder, { recursive: true });
  const noted = placedElsewhere(dataFolder);
  if (noted && existsSync(noted)) return noted;
  if (canEnter(user, path.resolve(dataFolder))) return here;
  const mark = createHash('sha256').update(here).digest('hex').slice(0, 12);
  const there = path.join(elsewhere(), `tapeline-${mark}`, 'postgres');
  mkdirSync(path.dirname(there), { recursive: true, mode: 0o755 });
  writeFileSync(noteIn(dataFolder), `${there}\n`);
  return there;
}

/** The noted folder outside, if there is one. */
export function placedElsewhere(dataFolder: string): string | undefined {
  const note = noteIn(dataFolder);
  return existsSync(note) ? readFileSync(note, 'utf8').trim() : undefined;
}

const noteIn = (dataFolder: string) => path.resolve(dataFolder, 'postgres.location');
