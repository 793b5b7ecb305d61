import { spawnSync } from 'node:child_process';
import { readFileSync, readlinkSync, realpathSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { runningAs, serverUser } from './serverUser';

export type LiveServer = { pid: number; port: number };

/**
 * The server that really serves this folder, whatever postmaster.pid claims: after a kill the number in it may belong to
 * any other process. A server's working folder is its data folder.
 */
export function liveServer(folder: string): LiveServer | undefined {
  const [pid, , , port] = pidFile(folder);
  if (!pid || !/^\d+$/.test(pid)) return undefined;
  try {
    const servesHere = workingFolderOf(pid) === realpathSync(folder);
    const isServer = readFileSync(`/proc/${pid}/comm`, 'utf8').startsWith('postgres');
    return servesHere && isServer ? { pid: Number(pid), port: Number(port) } : undefined;
  } catch {
    return undefined;
  }
}

/** Root without the right to look into another user's processes (a plain container) lets that user look. */
function workingFolderOf(pid: string): string {
  try {
    return readlinkSync(`/proc/${pid}/cwd`);
  } catch (error) {
    const denied = error instanceof Error && 'code' in error && (error.code === 'EACCES' || error.code === 'EPERM');
    if (!denied) throw error;
    return spawnSync('/usr/bin/readlink', [`/proc/${pid}/cwd`], {
      ...runningAs(serverUser()),
      encoding: 'utf8',
    }).stdout.trim();
  }
}

/** Whether the server wrote that it takes connections: line 8 of postmaster.pid. */
export function saysReady(folder: string) {
  return (pidFile(folder)[7] ?? '').startsWith('ready');
}

/** Waits until the server answers or is gone; undefined where it went. */
export async function untilItAnswers(folder: string, withinMs = 10_000): Promise<LiveServer | undefined> {
  const over = Date.now() + withinMs;
  for (;;) {
    const server = liveServer(folder);
    if (!server || (await talksPostgres(server.port))) return server;
    if (Date.now() > over) throw new Error(`The database server ${server.pid} in ${folder} lives and does not answer.`);
    await pause(100);
  }
}

/**
 * Source: PostgreSQL documentation, "Message Flow", SSL session encryption: to an SSLRequest (length 8, code 80877103)
 * a server answers with one byte, S or N.
 */
function talksPostgres(port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const socket = net.connect(port, '127.0.0.1', () => socket.write(Buffer.from([0, 0, 0, 8, 4, 210, 22, 47])));
    const done = (answer: boolean) => {
      socket.destroy();
      resolve(answer);
    };
    socket.setTimeout(1000, () => done(false));
    socket.on('error', () => done(false));
    socket.on('close', () => done(false));
    socket.once('data', (bytes) => done(bytes[0] === 0x53 || bytes[0] === 0x4e));
  });
}

function pidFile(folder: string): string[] {
  try {
    return readFileSync(path.join(folder, 'postmaster.pid'), 'utf8').split('\n');
  } catch {
    return [];
  }
}
