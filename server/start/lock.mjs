// @ts-check
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/**
 * A lock that is a folder with its owner's name in it. It appears whole (a folder cannot be renamed onto one that holds
 * something) and it is known to be left over when its owner no longer lives, so a kill -9 never locks anybody out.
 *
 * @typedef {{ pid: number, born: string, note?: unknown }} Owner
 * @typedef {{ describe(note: unknown): void, release(): void }} Held
 */

/**
 * Takes the lock.
 * @param {string} folder
 * @param {unknown} [note] what others read about the owner
 * @returns {{ held: Held } | { owner: Owner }} the lock, or who has it
 */
export function takeLock(folder, note) {
  const mine = path.join(path.dirname(folder), `.${path.basename(folder)}-${process.pid}-${Date.now()}`);
  mkdirSync(mine, { recursive: true });
  write(mine, note);
  for (;;) {
    try {
      renameSync(mine, folder);
      return { held: { describe: (more) => write(folder, more), release: () => release(folder) } };
    } catch (error) {
      const code = error instanceof Error && 'code' in error ? error.code : undefined;
      if (code !== 'ENOTEMPTY' && code !== 'EEXIST') throw error;
    }
    const owner = ownerOf(folder);
    if (owner && isAlive(owner)) {
      rmSync(mine, { recursive: true, force: true });
      return { owner };
    }
    putAside(folder, owner);
  }
}

/** @param {string} folder @returns {Owner | undefined} who has the lock, alive or not */
export function ownerOf(folder) {
  try {
    return JSON.parse(readFileSync(path.join(folder, 'owner.json'), 'utf8'));
  } catch {
    return undefined;
  }
}

/** @param {Owner} owner whether that very process lives, and not another one with its number */
export function isAlive(owner) {
  return bornOf(owner.pid) === owner.born;
}

/** @param {string} folder who holds it and lives @returns {Owner | undefined} */
export function livingOwnerOf(folder) {
  const owner = ownerOf(folder);
  return owner && isAlive(owner) ? owner : undefined;
}

/**
 * Puts a dead owner's lock aside under a name of that owner: whoever comes second finds the name taken and leaves the
 * lock that somebody took in between alone.
 * @param {string} folder @param {Owner | undefined} owner
 */
function putAside(folder, owner) {
  const parent = path.dirname(folder);
  const prefix = `.${path.basename(folder)}-dead-`;
  for (const name of readdirSync(parent).filter((entry) => entry.startsWith(prefix))) {
    const old = path.join(parent, name);
    if (existsSync(old) && Date.now() - statSync(old).ctimeMs > 60_000) rmSync(old, { recursive: true, force: true });
  }
  try {
    renameSync(folder, path.join(parent, `${prefix}${owner ? `${owner.pid}-${owner.born}` : 'unknown'}`));
  } catch (error) {
    const code = error instanceof Error && 'code' in error ? error.code : undefined;
    if (code !== 'ENOTEMPTY' && code !== 'EEXIST' && code !== 'ENOENT') throw error;
  }
}

/** @param {string} folder */
function release(folder) {
  if (ownerOf(folder)?.pid === process.pid) rmSync(folder, { recursive: true, force: true });
}

/** @param {string} folder @param {unknown} note */
function write(folder, note) {
  const owner = { pid: process.pid, born: bornOf(process.pid), note };
  writeFileSync(path.join(folder, 'owner.json.new'), JSON.stringify(owner));
  renameSync(path.join(folder, 'owner.json.new'), path.join(folder, 'owner.json'));
}

/**
 * When a process was born, told apart from every other with the same number: the 22nd field of /proc/PID/stat in this
 * boot of the machine. Empty where there is no such process.
 * @param {number} pid
 */
function bornOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    const boot = readFileSync('/proc/sys/kernel/random/boot_id', 'utf8').trim();
    return fields[0] === 'Z' ? '' : `${fields[19]}-${boot}`;
  } catch {
    return '';
  }
}
