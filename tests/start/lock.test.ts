import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { livingOwnerOf, takeLock } from '../../server/start/lock.mjs';

let parent: string;
let folder: string;

beforeEach(() => {
  parent = mkdtempSync(path.join(tmpdir(), 'tapeline-lock-'));
  folder = path.join(parent, 'running');
});
afterEach(() => rmSync(parent, { recursive: true, force: true }));

/** A process that takes the lock, says whether it got it, and waits. */
function taker() {
  const script = `
    import { takeLock } from ${JSON.stringify(path.resolve('server/start/lock.mjs'))};
    console.log('held' in takeLock(${JSON.stringify(folder)}, { url: 'here' }) ? 'held' : 'refused');
    setInterval(() => {}, 1000);`;
  return spawn(process.execPath, ['--input-type=module', '--eval', script], { stdio: ['ignore', 'pipe', 'inherit'] });
}
const said = async (child: ReturnType<typeof taker>) => String((await once(child.stdout, 'data'))[0]).trim();

it('is had by one at a time, and says whom', () => {
  const first = takeLock(folder, { url: 'here' });
  if (!('held' in first)) throw new Error('The lock was free.');
  expect(takeLock(folder)).toMatchObject({ owner: { pid: process.pid, note: { url: 'here' } } });
  first.held.release();
  expect(livingOwnerOf(folder)).toBeUndefined();
  expect(takeLock(folder)).toHaveProperty('held');
});

it('is free again when its owner was killed', async () => {
  const owner = taker();
  expect(await said(owner)).toBe('held');
  expect(takeLock(folder)).toMatchObject({ owner: { pid: owner.pid } });
  owner.kill('SIGKILL');
  await once(owner, 'exit');
  expect(takeLock(folder)).toHaveProperty('held');
});

it('is free when another process has the number of its owner now', () => {
  mkdirSync(folder);
  writeFileSync(path.join(folder, 'owner.json'), JSON.stringify({ pid: process.pid, born: 'another time' }));
  expect(takeLock(folder)).toHaveProperty('held');
});

it('goes to exactly one of several that find it left over', async () => {
  mkdirSync(folder);
  writeFileSync(path.join(folder, 'owner.json'), JSON.stringify({ pid: 1, born: 'never' }));
  const takers = Array.from({ length: 6 }, taker);
  const answers = await Promise.all(takers.map(said));
  for (const child of takers) child.kill('SIGKILL');
  expect(answers.filter((answer) => answer === 'held')).toHaveLength(1);
});
