// @ts-check
import { accessSync, constants, mkdirSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import { buildIfChanged } from './bootstrap/build.mjs';
import { installModulesIfChanged } from './bootstrap/modules.mjs';
import { checkNode } from './bootstrap/node.mjs';
import { installMissingPackages } from './bootstrap/packages.mjs';
import { CannotStart } from './cannotStart.mjs';
import { takeLock } from './lock.mjs';
import { step } from './step.mjs';

/** The clone that these files are in. */
export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');

/**
 * Makes a bare machine ready, with Node alone. Two at once in one clone take turns.
 * @param {{ browser?: boolean, build?: boolean }} needs
 */
export async function bootstrap({ browser = false, build = true } = {}) {
  process.chdir(root);
  checkNode();
  const lock = await waitForTurn(path.join(dataFolder(), 'setting-up'));
  try {
    await installMissingPackages({ browser });
    await installModulesIfChanged(root);
    if (build) await buildIfChanged(root);
  } finally {
    lock.release();
  }
}

/** Where this clone keeps its local data; made where it is missing. */
function dataFolder() {
  const folder = path.join(root, 'storage/data');
  try {
    mkdirSync(folder, { recursive: true });
    accessSync(folder, constants.W_OK);
    return folder;
  } catch {
    throw new CannotStart(`This user cannot write ${folder}. It belongs to whoever started first in this folder.`);
  }
}

/** @param {string} folder */
async function waitForTurn(folder) {
  const attempt = () => {
    const taken = takeLock(folder);
    return 'held' in taken ? taken.held : undefined;
  };
  return (
    attempt() ??
    step('Waiting for another start in this folder to set up', async () => {
      for (;;) {
        await pause(200);
        const held = attempt();
        if (held) return held;
      }
    })
  );
}
