// @ts-check
import { spawn } from 'node:child_process';
import { CannotStart } from '../cannotStart.mjs';

/**
 * Runs a program to its end, quietly; where it fails, throws with what it said. It ends when this process is told to.
 * @param {string} program
 * @param {readonly string[]} args
 * @param {NodeJS.ProcessEnv} [env]
 * @returns {Promise<void>}
 */
export function run(program, args, env = process.env) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { env, stdio: ['ignore', 'pipe', 'pipe'] });
    let said = '';
    const keep = (/** @type {Buffer} */ chunk) => {
      said = (said + chunk).slice(-8000);
    };
    const end = () => {
      child.once('close', () => process.exit(1));
      child.kill('SIGTERM');
    };
    process.once('SIGINT', end).once('SIGTERM', end);
    child.stdout.on('data', keep);
    child.stderr.on('data', keep);
    child.once('error', (error) => reject(new CannotStart(`${program} does not start: ${error.message}`)));
    child.once('close', (code, signal) => {
      process.off('SIGINT', end).off('SIGTERM', end);
      if (code === 0) resolve();
      else reject(new CannotStart(`${program} ${args.join(' ')} ended with ${code ?? signal}:\n${said}`));
    });
  });
}
