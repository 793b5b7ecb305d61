// @ts-check
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { bootstrap, root } from './bootstrap.mjs';
import { CannotStart, giveUp } from './cannotStart.mjs';
import { browserSuite, check, suites } from './checks.mjs';

/**
 * `npm test`: sets up as `npm start` does, then checks and suites, each counted, and the totals as the last line.
 * With paths (`npm test -- tests/domain`) it runs those tests alone.
 */
const wanted = process.argv.slice(2);
const browserPaths = wanted.filter((name) => name.includes('tests/browser'));
const otherPaths = wanted.filter((name) => !browserPaths.includes(name));
const everything = wanted.length === 0;

/** @type {{ name: string, passed: number, failed: number, seconds: number }[]} */
const results = [];

/** @param {string} name @param {() => Promise<{ passed: number, failed: number }>} work */
async function count(name, work) {
  console.log(`\n── ${name}`);
  const began = Date.now();
  results.push({ name, ...(await work()), seconds: Math.round((Date.now() - began) / 1000) });
}

try {
  await bootstrap({ browser: everything || browserPaths.length > 0, build: everything || browserPaths.length > 0 });
  const reports = mkdtempSync(path.join(tmpdir(), 'tapeline-test-'));
  try {
    if (everything) {
      await count('Types', () => check('node_modules/typescript-7/bin/tsc', '--noEmit'));
      await count('Lint', () => check('node_modules/@biomejs/biome/bin/biome', 'check', '.'));
      await count('Import rules', () => check('tests/support/importRules.mjs'));
    }
    if (everything || otherPaths.length > 0) await count('Suites', () => suites(otherPaths, reports));
    const hasBrowserSuite = existsSync(path.join(root, 'playwright.config.ts'));
    if (hasBrowserSuite && (everything || browserPaths.length > 0)) {
      await count('Browser', () => browserSuite(browserPaths, reports));
    }
  } finally {
    rmSync(reports, { recursive: true, force: true });
  }
} catch (error) {
  if (!(error instanceof CannotStart)) giveUp(error);
  console.error(error.message);
  results.push({ name: 'Setting up', passed: 0, failed: 1, seconds: 0 });
}

const sum = (/** @type {'passed' | 'failed'} */ what) => results.reduce((total, result) => total + result[what], 0);
console.log('');
for (const { name, passed, failed, seconds } of results) {
  console.log(`${name}: ${passed} passed, ${failed} failed (${seconds} s)`);
}
process.exitCode = sum('failed') > 0 || sum('passed') === 0 ? 1 : 0;
console.log(`${sum('passed')} passed, ${sum('failed')} failed`);
