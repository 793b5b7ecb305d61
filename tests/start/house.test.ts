import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { stopCluster } from '../../server/start/postgres/cluster';
import { liveServer } from '../../server/start/postgres/liveServer';

/** What a start brings up around two processes that stand in for web and worker: the real database, store and mailbox. */
let folder: string;
let data: string;
const launchers: ChildProcess[] = [];

beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'tapeline-house-'));
  chmodSync(folder, 0o755);
  data = path.join(folder, 'data');
});
afterEach(async () => {
  for (const launcher of launchers.splice(0)) launcher.kill('SIGKILL');
  // what matters is that they end; how soon depends on what else this machine does
  await expect.poll(pidsBelow, { timeout: 60_000 }).toEqual([]);
  await stopCluster(path.join(data, 'postgres'));
  rmSync(folder, { recursive: true, force: true });
});

const notes = () => path.join(folder, 'pids');

/** Every process that stood in for web or worker and lives. */
function pidsBelow(): number[] {
  const all = readIfThere(notes()).split('\n').filter(Boolean).map(Number);
  return all.filter((pid) => {
    const status = readIfThere(`/proc/${pid}/status`);
    return status !== '' && !/^State:\s*Z/m.test(status);
  });
}

function readIfThere(file: string) {
  try {
    return readFileSync(file, 'utf8');
  } catch {
    return '';
  }
}

/** A launcher as a process of its own, so that it can be killed; its first message tells how it went. */
function launch() {
  const script = (name: string, text: string) => {
    const file = path.join(folder, `${name}.mjs`);
    const note = `import { appendFileSync } from 'node:fs';\nappendFileSync(${JSON.stringify(notes())}, process.pid + '\\n');\n`;
    writeFileSync(file, note + text);
    return JSON.stringify(['--import', 'tsx', '--import', path.resolve('server/start/leash.ts'), file]);
  };
  const web = script(
    'web',
    `import http from 'node:http';
     const server = http.createServer((_, response) => response.end(JSON.stringify(process.env)));
     server.listen(Number(process.env.PORT), process.env.HOST, () => process.send({ ready: true }));
     process.on('SIGTERM', () => process.exit(0));`,
  );
  // one that does not end when it is told to, with a child as ffmpeg would be
  const worker = script(
    'worker',
    `import { spawn } from 'node:child_process';
     const child = spawn('sleep', ['120']);
     appendFileSync(${JSON.stringify(notes())}, child.pid + '\\n');
     process.on('SIGTERM', () => {});
     setInterval(() => {}, 1000);`,
  );
  const prepare = script('prepare', 'process.send({ seeded: false, signIns: [] });');
  const main = path.join(folder, 'main.mts');
  writeFileSync(
    main,
    `import { Opening } from '${path.resolve('server/start/house')}';
     import { endOnSignal } from '${path.resolve('server/start/signals')}';
     import { sourceEntries } from '${path.resolve('server/start/entries')}';
     import { freePort } from '${path.resolve('server/start/ports')}';
     const opening = new Opening();
     endOnSignal(opening);
     const port = await freePort();
     const entries = { web: ${web}, worker: ${worker}, prepare: ${prepare}, fakeStore: sourceEntries.fakeStore };
     try {
       const { url, mailPage, databaseUrl } = await opening.open({ entries, dataFolder: ${JSON.stringify(data)},
         host: '127.0.0.1', webPort: port, frontPort: port, mode: 'production', say: () => {} });
       process.send({ url, mailPage, databaseUrl });
     } catch (error) {
       process.send({ refused: error.message });
       await opening.close();
       process.exit(1);
     }`,
  );
  const { DATABASE_URL, S3_ENDPOINT, S3_BUCKET, SMTP_URL, PUBLIC_URL, ...env } = process.env;
  const launcher = spawn(process.execPath, ['--import', 'tsx', main], {
    env: { ...env, TAPELINE_DISPOSABLE: 'yes' },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  launchers.push(launcher);
  return launcher;
}

type Word = { url: string; mailPage: string; databaseUrl: string; refused?: string };
async function word(launcher: ChildProcess): Promise<Word> {
  const ended = once(launcher, 'exit').then(([code]) => Promise.reject(new Error(`It ended with ${code}.`)));
  const [message] = await Promise.race([once(launcher, 'message'), ended]);
  return message;
}
const cluster = () => liveServer(path.join(data, 'postgres'));

it('ends everything that it started, also what does not listen, within 10 s', async () => {
  const launcher = launch();
  const { url, mailPage } = await word(launcher);
  const env = await (await fetch(url)).json();
  const store = env.S3_ENDPOINT;
  expect(pidsBelow()).toHaveLength(3);
  expect((await fetch(store)).status).toBe(403);
  const began = Date.now();
  launcher.kill('SIGTERM');
  const [code] = await once(launcher, 'exit');
  expect(code).toBe(0);
  expect(Date.now() - began).toBeLessThan(10_000);
  await expect.poll(pidsBelow).toEqual([]);
  expect(cluster()).toBeUndefined();
  for (const address of [url, mailPage, store]) await expect(fetch(address)).rejects.toThrow();
});

it('refuses a second start in its folder and leaves the first alone', async () => {
  const { url } = await word(launch());
  expect((await word(launch())).refused).toMatch(/^Tapeline runs in this folder already \(process \d+\)/);
  expect((await fetch(url)).ok).toBe(true);
});

it('recovers after kill -9: nobody stays behind, the database is taken over, secrets are the same', async () => {
  const first = launch();
  const before = await (await fetch((await word(first)).url)).json();
  const server = cluster();
  first.kill('SIGKILL');
  await once(first, 'exit');
  const second = await word(launch());
  const after = await (await fetch(second.url)).json();
  expect(cluster()).toEqual(server);
  for (const name of ['DATABASE_URL', 'SESSION_SECRET', 'MEDIA_SECRET', 'S3_ACCESS_KEY_ID', 'S3_SECRET_ACCESS_KEY']) {
    expect(after[name], name).toBe(before[name]);
  }
});
