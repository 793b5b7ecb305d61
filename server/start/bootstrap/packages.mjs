// @ts-check
import { accessSync, constants, existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { CannotStart } from '../cannotStart.mjs';
import { step } from '../step.mjs';
import { run } from './run.mjs';

/** @type {{ name: string, when?: 'browser' | 'ownDatabase', isThere(): boolean }[]} */
const packages = [
  { name: 'postgresql', when: 'ownDatabase', isThere: hasDatabaseServer },
  { name: 'ffmpeg', isThere: () => isProgram('ffmpeg') && isProgram('ffprobe') },
  { name: 'espeak-ng', isThere: () => isProgram('espeak-ng') },
  { name: 'chromium', when: 'browser', isThere: () => existsSync('/usr/bin/chromium') },
];

/**
 * Installs the Debian packages that are missing when this is root; otherwise names the one line to type.
 * @param {{ browser: boolean }} needs
 */
export async function installMissingPackages({ browser }) {
  const wanted = packages.filter(
    ({ when }) => when === undefined || (when === 'browser' ? browser : browser || !process.env.DATABASE_URL),
  );
  const missing = wanted.filter((item) => !item.isThere()).map((item) => item.name);
  if (missing.length === 0) return;
  const install = ['install', '--no-install-recommends', '--yes', ...missing];
  if (process.getuid?.() !== 0 || !isProgram('apt-get')) {
    throw new CannotStart(
      `Missing: ${missing.join(', ')}. Type this once, then start again:\n  sudo apt-get update && sudo apt-get ${install.join(' ')}`,
    );
  }
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  await step('Reading the list of Debian packages', () => run('apt-get', ['update'], env));
  await step(`Installing ${missing.join(', ')}`, () => run('apt-get', install, env));
  const still = wanted.filter((item) => !item.isThere()).map((item) => item.name);
  if (still.length > 0) throw new CannotStart(`Installed and still not found: ${still.join(', ')}.`);
}

function hasDatabaseServer() {
  const folder = '/usr/lib/postgresql';
  const versions = existsSync(folder) ? readdirSync(folder).map((name) => path.join(folder, name, 'bin')) : [];
  return [process.env.PG_BIN ?? '', ...versions].some((bin) => bin !== '' && existsSync(path.join(bin, 'initdb')));
}

/** @param {string} name */
function isProgram(name) {
  return (process.env.PATH ?? '').split(path.delimiter).some((folder) => {
    try {
      accessSync(path.join(folder, name), constants.X_OK);
      return true;
    } catch {
      return false;
    }
  });
}
