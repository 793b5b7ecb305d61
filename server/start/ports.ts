import net from 'node:net';

const loopback = '127.0.0.1';

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

/**
 * The port for the product: the wanted one, or without a wish 4310 and the ones after it.
 * @throws Error in plain words where the wanted one is taken
 */
export async function choosePort(wanted: string | undefined, host = loopback): Promise<number> {
  if (wanted !== undefined && wanted !== '') {
    const port = Number(wanted);
    if (!Number.isInteger(port) || port < 0 || port > 65535)
      throw new Error(`PORT is "${wanted}": a whole number up to 65535 is needed.`);
    if (port === 0) return freePort();
    if (await isFree(port, host)) return port;
    throw new Error(`Port ${port} is taken. Choose another with PORT, or leave PORT away to take the next free one.`);
  }
  for (let port = 4310; port < 4410; port++) if (await isFree(port, host)) return port;
  return freePort();
}
