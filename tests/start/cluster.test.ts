import { type ChildProcess, spawn } from 'node:child_process';
import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import pg from 'pg';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { type Cluster, startCluster, stopCluster } from '../../server/start/postgres/cluster';
import { copyDatabase, dropDatabase, makeDatabase } from '../../server/start/postgres/databases';
import { liveServer } from '../../server/start/postgres/liveServer';
import { placeCluster } from '../../server/start/postgres/placement';
import { serverUser } from '../../server/start/postgres/serverUser';

let data: string;
let folder: string | undefined;
const others: ChildProcess[] = [];

beforeEach(() => {
  data = mkdtempSync(path.join(tmpdir(), 'tapeline-cluster-'));
  chmodSync(data, 0o755);
});
afterEach(async () => {
  if (folder) await stopCluster(folder);
  folder = undefined;
  for (const other of others.splice(0)) other.kill('SIGKILL');
  rmSync(data, { recursive: true, force: true });
});

async function start(): Promise<Cluster> {
  const cluster = await startCluster(data, 'disposable');
  folder = cluster.folder;
  return cluster;
}

async function ask(url: string, sql: string) {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query(sql)).rows;
  } finally {
    await client.end();
  }
}

const pidFile = (cluster: Cluster) => path.join(cluster.folder, 'postmaster.pid');

async function untilGone(cluster: Cluster) {
  await expect.poll(() => liveServer(cluster.folder), { timeout: 10_000 }).toBeUndefined();
}

describe('our own database server', () => {
  it('takes no connection without its password, and keeps that to its owner', async () => {
    const cluster = await start();
    expect(await ask(cluster.urlOf('postgres'), 'select 1 as one')).toEqual([{ one: 1 }]);
    const other = new URL(cluster.urlOf('postgres'));
    other.password = 'guess';
    await expect(ask(other.href, 'select 1')).rejects.toThrow(/password authentication failed/);
    expect(statSync(`${cluster.folder}.password`).mode & 0o077).toBe(0);
  });

  it('keeps its data over an orderly end', async () => {
    const first = await start();
    await ask(first.urlOf('postgres'), 'create table kept (n int)');
    await stopCluster(first.folder);
    expect(liveServer(first.folder)).toBeUndefined();
    const second = await start();
    expect(second.adopted).toBe(false);
    expect(await ask(second.urlOf('postgres'), 'select count(*)::int as n from kept')).toEqual([{ n: 0 }]);
  });

  it('adopts the server that a killed start left running', async () => {
    const first = await start();
    const second = await start();
    expect(second).toMatchObject({ adopted: true, pid: first.pid, port: first.port });
  });

  it('recovers when the server itself was killed', async () => {
    const first = await start();
    process.kill(first.pid, 'SIGKILL');
    await untilGone(first);
    expect(existsSync(pidFile(first))).toBe(true);
    const second = await start();
    expect(second.adopted).toBe(false);
    expect(await ask(second.urlOf('postgres'), 'select 1 as one')).toEqual([{ one: 1 }]);
  });

  it('leaves the process alone whose number a stale pid file carries', async () => {
    const first = await start();
    await stopCluster(first.folder);
    const stranger = spawn('sleep', ['60']);
    others.push(stranger);
    writeFileSync(pidFile(first), `${stranger.pid}\n${first.folder}\n0\n${first.port}\n\n127.0.0.1\n\nready\n`);
    await stopCluster(first.folder);
    const second = await start();
    expect(second.pid).not.toBe(stranger.pid);
    await stopCluster(second.folder);
    expect(stranger.exitCode).toBeNull();
    expect(stranger.signalCode).toBeNull();
  });

  it('adopts no server of another folder, though a pid file points at it', async () => {
    const first = await start();
    const otherData = path.join(data, 'other');
    mkdirSync(otherData);
    const other = await startCluster(otherData, 'disposable');
    try {
      await stopCluster(first.folder);
      writeFileSync(pidFile(first), readFileSync(pidFile(other)));
      const again = await start();
      expect(again.adopted).toBe(false);
      expect(again.port).not.toBe(other.port);
      await stopCluster(again.folder);
      expect(liveServer(other.folder)?.pid).toBe(other.pid);
    } finally {
      await stopCluster(other.folder);
    }
  });

  it('starts anew where making the cluster was cut off', async () => {
    mkdirSync(path.join(data, 'postgres.new'));
    writeFileSync(path.join(data, 'postgres.new', 'PG_VERSION'), '15\n');
    const cluster = await start();
    expect(await ask(cluster.urlOf('postgres'), 'select 1 as one')).toEqual([{ one: 1 }]);
    expect(existsSync(path.join(data, 'postgres.new'))).toBe(false);
  });

  it('copies a database by its files', async () => {
    const cluster = await start();
    const server = cluster.urlOf('postgres');
    expect(await makeDatabase(server, 'original')).toBe(true);
    expect(await makeDatabase(server, 'original')).toBe(false);
    await ask(cluster.urlOf('original'), 'create table seen as select 7 as n');
    await copyDatabase(server, 'original', 'copy');
    expect(await ask(cluster.urlOf('copy'), 'select n from seen')).toEqual([{ n: 7 }]);
    await dropDatabase(server, 'copy');
    await expect(ask(cluster.urlOf('copy'), 'select 1')).rejects.toThrow(/does not exist/);
  });
});

describe('where the cluster goes', () => {
  it('stays below the data folder where the server can enter it', () => {
    expect(placeCluster(data, serverUser())).toBe(path.join(data, 'postgres'));
  });

  it.runIf(process.getuid?.() === 0)('goes outside, to one place, where only root can enter the clone', () => {
    const clusters = mkdtempSync(path.join(tmpdir(), 'tapeline-outside-'));
    process.env.TAPELINE_CLUSTERS = clusters;
    try {
      chmodSync(data, 0o700);
      const place = placeCluster(path.join(data, 'storage'), serverUser());
      expect(place.startsWith(clusters)).toBe(true);
      expect(placeCluster(path.join(data, 'storage'), serverUser())).toBe(place);
      expect(placeCluster(path.join(data, 'another'), serverUser())).not.toBe(place);
    } finally {
      delete process.env.TAPELINE_CLUSTERS;
      rmSync(clusters, { recursive: true, force: true });
    }
  });
});
