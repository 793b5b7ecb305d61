// @ts-check
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { step } from '../step.mjs';
import { run } from './run.mjs';

/** What the built product is made from. */
const sources = ['src', 'shared', 'server', 'storage', 'public', 'index.html', 'package-lock.json', 'package.json'];
const configs = /^(vite\.|tailwind\.|postcss\.|tsconfig).*(ts|js|mjs|json)$/;

/**
 * Builds client and server when a source changed since the last build that came to its end.
 * @param {string} root
 */
export async function buildIfChanged(root) {
  const wanted = fingerprint(root);
  const stamp = path.join(root, 'dist/.built-from');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8').trim() === wanted) return;
  rmSync(stamp, { force: true });
  const vite = path.join(root, 'node_modules/vite/bin/vite.js');
  const env = { ...process.env, NODE_ENV: 'production' };
  const build = (/** @type {string[]} */ ...args) =>
    run(process.execPath, [vite, 'build', '--logLevel', 'warn', ...args], env);
  await step('Building the pages', () => build());
  await step('Building the server', () => build('--config', 'vite.server.config.ts'));
  mkdirSync(path.dirname(stamp), { recursive: true });
  writeFileSync(stamp, `${wanted}\n`);
}

/** @param {string} root */
function fingerprint(root) {
  const hash = createHash('sha256').update(process.versions.node.split('.')[0] ?? '');
  const own = readdirSync(root).filter((name) => configs.test(name));
  for (const file of [...sources, ...own].flatMap((name) => filesIn(root, name)).sort()) {
    hash
      .update(file)
      .update('\0')
      .update(readFileSync(path.join(root, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

/** @param {string} root @param {string} name @returns {string[]} */
function filesIn(root, name) {
  const place = path.join(root, name);
  if (!existsSync(place) || /^storage\/data/.test(name)) return [];
  if (!statSync(place).isDirectory()) return [name];
  return readdirSync(place).flatMap((entry) => filesIn(root, `${name}/${entry}`));
}
