import net from 'node:net';
import { afterEach, expect, it } from 'vitest';
import { choosePort, freePort, isFree } from '../../server/start/ports';

const servers: net.Server[] = [];
afterEach(() => {
  for (const server of servers.splice(0)) server.close();
});
const listen = (port: number) =>
  new Promise<void>((resolve) => {
    servers.push(net.createServer().listen(port, '127.0.0.1', resolve));
  });

it('honours PORT, and says so where it is taken', async () => {
  const port = await freePort();
  const chosen = await choosePort(String(port));
  expect(chosen.port).toBe(port);
  // spoken for, though nobody listens yet
  await expect(choosePort(String(port))).rejects.toThrow(`Port ${port} is taken.`);
  chosen.release();
  await listen(port);
  await expect(choosePort(String(port))).rejects.toThrow(`Port ${port} is taken.`);
});

it('refuses a PORT that is no port', async () => {
  await expect(choosePort('http')).rejects.toThrow('PORT is "http"');
  await expect(choosePort('70000')).rejects.toThrow('PORT is "70000"');
});

it('takes the next free one where no PORT is given', async () => {
  const first = await choosePort(undefined);
  const second = await choosePort(undefined);
  first.release();
  second.release();
  expect(second.port).toBeGreaterThan(first.port);
  expect(await isFree(second.port)).toBe(true);
});
