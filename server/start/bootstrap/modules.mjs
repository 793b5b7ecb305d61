// @ts-check
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { step } from '../step.mjs';
import { run } from './run.mjs';

/**
 * Installs the modules when the lock changed since they were.
 * @param {string} root
 */
export async function installModulesIfChanged(root) {
  const lock = readFileSync(path.join(root, 'package-lock.json'));
  const wanted = createHash('sha256').update(lock).digest('hex');
  const stamp = path.join(root, 'node_modules/.tapeline-lock');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8').trim() === wanted) return;
  if (!isInstalled(root, JSON.parse(lock.toString()))) {
    const [program, ...first] = npm();
    // the build needs the development modules too, whatever NODE_ENV says
    const args = [...first, 'ci', '--include=dev', '--no-audit', '--no-fund'];
    await step('Installing modules', () => run(program, args));
  }
  writeFileSync(stamp, `${wanted}\n`);
}

/**
 * Whether what npm noted at its last install is what the lock wants, as after `npm install` by hand. npm writes the note
 * at the very end, so an install that was cut off has none.
 * @param {string} root
 * @param {{ packages: Record<string, { version?: string, integrity?: string, optional?: boolean }> }} lock
 */
function isInstalled(root, lock) {
  const note = path.join(root, 'node_modules/.package-lock.json');
  if (!existsSync(note)) return false;
  /** @type {typeof lock} */
  const installed = JSON.parse(readFileSync(note, 'utf8'));
  return Object.entries(lock.packages).every(([place, wanted]) => {
    if (place === '') return true;
    const found = installed.packages[place];
    // other machines' builds of a module are optional and not here
    if (!found) return wanted.optional === true;
    return found.version === wanted.version && found.integrity === wanted.integrity;
  });
}

/** npm as it started us, or the one on the path. @returns {[string, ...string[]]} */
function npm() {
  const own = process.env.npm_execpath;
  return own?.endsWith('.js') ? [process.execPath, own] : ['npm'];
}
