import net from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { CannotStart } from './cannotStart.mjs';
import { livingOwnerOf, takeLock } from './lock.mjs';

const loopback = '127.0.0.1';
const firstPort = 4310;
const portsTried = 100;

/** A loopback port that was free a moment ago. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen(0, loopback, () => {
      const address = server.address();
      server.close(() =>
        address && typeof address === 'object' ? resolve(address.port) : reject(new Error('no port')),
      );
    });
  });
}

/** Whether nobody listens there, on this host's address. */
export function isFree(port: number, host = loopback): Promise<boolean> {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

export type ChosenPort = { port: number; release(): void };

/**
 * The port for the product: the wanted one, or without a wish 4310 and the ones after it. It is spoken for until the end,
 * so that two starts at the same moment never choose the same.
 * @throws CannotStart in plain words where the wanted one is taken
 */
export async function choosePort(wanted: string | undefined, host = loopback): Promise<ChosenPort> {
  if (wanted !== undefined && wanted !== '') {
    const port = Number(wanted);
    if (!Number.isInteger(port) || port < 0 || port > 65535) {
      throw new CannotStart(`PORT is "${wanted}": a whole number up to 65535 is needed.`);
    }
    const chosen = port === 0 ? { port: await freePort(), release: () => {} } : await reserve(port, host);
    if (chosen) return chosen;
    throw new CannotStart(
      `Port ${port} is taken. Choose another with PORT, or leave PORT away to take the next free one.`,
    );
  }
  for (let port = firstPort; port < firstPort + portsTried; port++) {
    const chosen = await reserve(port, host);
    if (chosen) return chosen;
  }
  return { port: await freePort(), release: () => {} };
}

/** Speaks for a port among all starts on this machine; undefined where somebody has it. */
async function reserve(port: number, host: string): Promise<ChosenPort | undefined> {
  const folder = path.join(tmpdir(), `tapeline-port-${port}`);
  if (livingOwnerOf(folder) || !(await isFree(port, host))) return undefined;
  try {
    const taken = takeLock(folder);
    return 'held' in taken ? { port, release: taken.held.release } : undefined;
  } catch {
    // left over by another user: nobody lives there, and it is not ours to remove
    return { port, release: () => {} };
  }
}
