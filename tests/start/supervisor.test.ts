import { mkdtempSync, openSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { keepRunning, type Supervised } from '../../server/start/supervisor';

let folder: string;
let running: Supervised | undefined;

beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'tapeline-supervisor-'));
});
afterEach(async () => {
  await running?.stop(1000);
  running = undefined;
  rmSync(folder, { recursive: true, force: true });
});

/** Starts a script that notes its number; gives the numbers of all its lives. */
function keep(script: string) {
  const notes = path.join(folder, 'lives');
  const file = path.join(folder, 'program.mjs');
  writeFileSync(notes, '');
  writeFileSync(
    file,
    `import fs from 'node:fs';\nfs.appendFileSync(${JSON.stringify(notes)}, process.pid + '\\n');\n${script}`,
  );
  const said: string[] = [];
  const output = openSync(path.join(folder, 'log'), 'a');
  running = keepRunning({ name: 'It', args: [file], env: {}, output }, (line) => said.push(line));
  return { said, lives: () => readFileSync(notes, 'utf8').split('\n').filter(Boolean).map(Number) };
}

/** A process that ended and that nobody has asked after yet is gone. */
function isThere(pid: number) {
  try {
    return !/^State:\s*Z/m.test(readFileSync(`/proc/${pid}/status`, 'utf8'));
  } catch {
    return false;
  }
}

it('starts a program again that was killed, and says so', async () => {
  const { said, lives } = keep('setInterval(() => {}, 1000);');
  await expect.poll(lives).toHaveLength(1);
  process.kill(lives()[0] ?? 0, 'SIGKILL');
  await expect.poll(lives, { timeout: 5000 }).toHaveLength(2);
  expect(said).toEqual(['It ended (SIGKILL); it starts again in 0.5 s.']);
});

it('waits longer each time for one that does not stay', async () => {
  const { said } = keep('process.exit(3);');
  await expect.poll(() => said.length, { timeout: 10_000 }).toBe(3);
  expect(said.map((line) => line.match(/in ([\d.]+) s/)?.[1])).toEqual(['0.5', '1', '2']);
});

it('ends one that does not listen, with what it started', async () => {
  const { lives } = keep(`
    import { spawn } from 'node:child_process';
    process.on('SIGTERM', () => {});
    const child = spawn('sleep', ['60']);
    fs.appendFileSync(process.argv[1].replace('program.mjs', 'lives'), child.pid + '\\n');
    setInterval(() => {}, 1000);`);
  await expect.poll(lives).toHaveLength(2);
  const began = Date.now();
  await running?.stop(300);
  expect(Date.now() - began).toBeLessThan(3000);
  await expect.poll(() => lives().filter(isThere)).toEqual([]);
});

it('does not start again what was asked to end', async () => {
  const { lives } = keep('setInterval(() => {}, 1000);');
  await expect.poll(lives).toHaveLength(1);
  await running?.stop(1000);
  await new Promise((resolve) => setTimeout(resolve, 900));
  expect(lives()).toHaveLength(1);
});

it('starts anew on request, without a pause', async () => {
  const { said, lives } = keep('setInterval(() => {}, 1000);');
  await expect.poll(lives).toHaveLength(1);
  await running?.restart();
  await expect.poll(lives).toHaveLength(2);
  expect(isThere(lives()[0] ?? 0)).toBe(false);
  expect(said).toEqual([]);
});
