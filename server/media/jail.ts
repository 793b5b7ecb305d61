import { createHash, randomUUID } from 'node:crypto';
import { accessSync, constants, existsSync, lstatSync, mkdirSync, renameSync, writeFileSync } from 'node:fs';
import { homedir, tmpdir } from 'node:os';
import { join } from 'node:path';
import { prlimitArguments, probeLimits, type RunLimits } from './policy';

/**
 * Every step is an `exec`, so the process that is killed on abort is ffmpeg itself. Its first argument carries the
 * limits of the run; without it (the runner asking for the list of encoders) the smallest ones hold.
 * Making waits for whoever is served at the moment: `nice`.
 */
const script = `#!/bin/sh
limits='${prlimitArguments(probeLimits).join(' ')}'
case "$1" in limits:*) limits=\${1#limits:}; shift ;; esac
exec nice -n 10 prlimit $limits -- ffmpeg "$@"
`;

/** The first argument of a run in the jail. */
export const limitsArgument = (run: RunLimits) => `limits:${prlimitArguments(run).join(' ')}`;

let path: string | undefined;

/**
 * The program that runs ffmpeg under the policy's limits, in a folder that belongs to this user alone: it is written when first used,
 * so it is there from source and from the built server alike, and again when a cleaner of temporary files has taken it away.
 * A place where nothing may be executed, or where somebody else holds the folder's name, is passed over.
 */
export function jailPath(): string {
  if (path === undefined || !existsSync(path)) path = write([tmpdir(), '/var/tmp', homedir()]);
  return path;
}

function write(places: readonly string[]): string {
  const refused: string[] = [];
  for (const place of places) {
    try {
      const file = join(ownFolder(place), `ffmpeg-${createHash('sha256').update(script).digest('hex').slice(0, 12)}`);
      // another process may be writing the same: the rename makes it appear whole
      const aside = `${file}-${randomUUID()}`;
      writeFileSync(aside, script, { mode: 0o700, flag: 'wx' });
      renameSync(aside, file);
      accessSync(file, constants.X_OK);
      return file;
    } catch (error) {
      refused.push(`${place}: ${error instanceof Error ? error.message : String(error)}`);
    }
  }
  throw new Error(`No folder to run ffmpeg from. ${refused.join('; ')}`);
}

function ownFolder(place: string): string {
  const user = process.getuid?.() ?? 0;
  const folder = join(place, `tapeline-media-${user}`);
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const found = lstatSync(folder);
  if (!found.isDirectory() || found.uid !== user || (found.mode & 0o077) !== 0)
    throw new Error(`${folder} is not ours`);
  return folder;
}
