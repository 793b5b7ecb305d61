import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';

export type ServerUser = { uid: number; gid: number };

const iAmRoot = () => process.getuid?.() === 0;

/** Whom the database server runs as: PostgreSQL refuses root, so root hands it to the package's own user. */
export function serverUser(): ServerUser {
  if (!iAmRoot()) return { uid: process.getuid?.() ?? -1, gid: process.getgid?.() ?? -1 };
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((entry) => entry.split(':'))
    .find(([name]) => name === 'postgres');
  if (!line) throw new Error('There is no system user "postgres": install the Debian package postgresql.');
  return { uid: Number(line[2]), gid: Number(line[3]) };
}

/** What to add to a spawn so that it runs as this user; only root can change. */
export function runningAs(user: ServerUser) {
  return {
    ...(iAmRoot() ? { uid: user.uid, gid: user.gid } : {}),
    // the caller's folder may be closed to that user
    cwd: '/',
    env: { PATH: process.env.PATH, LC_ALL: 'C.UTF-8', TZ: 'UTC', HOME: '/tmp' },
  };
}

/** Asks the kernel, by a child that runs as the user, whether that user can enter the folder. */
export function canEnter(user: ServerUser, folder: string): boolean {
  return spawnSync('/usr/bin/test', ['-x', folder], runningAs(user)).status === 0;
}

export function giveTo(user: ServerUser, chown: (uid: number, gid: number) => void) {
  if (iAmRoot()) chown(user.uid, user.gid);
}
