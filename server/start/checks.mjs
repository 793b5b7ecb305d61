// @ts-check
import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';

/** @typedef {{ passed: number, failed: number }} Counted */

/**
 * A program that passes or fails as a whole.
 * @param {string} script
 * @param {...string} args
 * @returns {Promise<Counted>}
 */
export async function check(script, ...args) {
  const good = (await run([script, ...args])) === 0;
  return { passed: good ? 1 : 0, failed: good ? 0 : 1 };
}

/**
 * Everything that Vitest runs, or these paths of it.
 * @param {readonly string[]} paths
 * @param {string} reports a folder for the machine's report
 * @returns {Promise<Counted>}
 */
export async function suites(paths, reports) {
  const file = path.join(reports, 'suites.json');
  const reporting = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`];
  const code = await run(['node_modules/vitest/vitest.mjs', 'run', ...reporting, ...paths], { NODE_ENV: 'test' });
  const report = read(file);
  // a file that cannot be loaded, or a suite whose setting up failed, has no failed test of its own
  const broken = (report?.testResults ?? []).filter(hasNoFailedTest);
  return honest(code, report?.numPassedTests ?? 0, (report?.numFailedTests ?? 0) + broken.length);
}

/** @param {{ status: string, assertionResults: { status: string }[] }} file */
function hasNoFailedTest({ status, assertionResults }) {
  return status === 'failed' && !assertionResults.some((test) => test.status === 'failed');
}

/**
 * The browser suite, which brings up the built product for itself.
 * @param {readonly string[]} paths
 * @param {string} reports
 * @returns {Promise<Counted>}
 */
export async function browserSuite(paths, reports) {
  const file = path.join(reports, 'browser.json');
  const code = await run(['node_modules/@playwright/test/cli.js', 'test', '--reporter=list,json', ...paths], {
    PLAYWRIGHT_JSON_OUTPUT_NAME: file,
    PLAYWRIGHT_SKIP_BROWSER_DOWNLOAD: '1',
  });
  const stats = read(file)?.stats;
  return honest(code, (stats?.expected ?? 0) + (stats?.flaky ?? 0), stats?.unexpected ?? 0);
}

/**
 * A run that ended badly never counts as good, whatever its report says.
 * @param {number} code @param {number} passed @param {number} failed
 * @returns {Counted}
 */
function honest(code, passed, failed) {
  return { passed, failed: code !== 0 && failed === 0 ? 1 : failed };
}

/**
 * Runs a script of Node in the terminal and ends it when this process is told to.
 * @param {readonly string[]} args
 * @param {NodeJS.ProcessEnv} [env]
 * @returns {Promise<number>} its exit code
 */
function run(args, env = {}) {
  return new Promise((resolve) => {
    const child = spawn(process.execPath, args, {
      env: { ...process.env, ...env },
      stdio: ['ignore', 'inherit', 'inherit'],
    });
    /** @param {NodeJS.Signals} signal */
    const end = (signal) => {
      child.once('close', () => process.exit(1));
      child.kill(signal);
    };
    process.once('SIGINT', end).once('SIGTERM', end);
    child.once('error', () => resolve(1));
    child.once('close', (code) => {
      process.off('SIGINT', end).off('SIGTERM', end);
      resolve(code ?? 1);
    });
  });
}

/** @param {string} file */
function read(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return undefined;
  }
}
