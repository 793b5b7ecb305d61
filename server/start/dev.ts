import { once } from 'node:events';
import { createServer as createHttpServer } from 'node:http';
import path from 'node:path';
import { createServer } from 'vite';
import { giveUp } from './cannotStart.mjs';
import { sourceEntries } from './entries';
import { Opening } from './house';
import { choosePort, freePort } from './ports';
import { endOnSignal } from './signals';
import { welcome } from './welcome';

/** Pages from Vite with hot reload in front; the web process behind it; both processes start anew when their source changes. */
const opening = new Opening();
const signalled = endOnSignal(opening);
const watched = ['server', 'shared', 'storage'].map((folder) => path.resolve(folder));
const quietMs = 150;

try {
  const host = process.env.HOST || '127.0.0.1';
  const { port: frontPort, release } = await choosePort(process.env.PORT, host);
  opening.onEnd(release);
  const webPort = await freePort();
  const house = await opening.open({
    entries: sourceEntries,
    dataFolder: path.resolve(process.env.TAPELINE_DATA || 'storage/data'),
    host: '127.0.0.1',
    webPort,
    frontPort,
    mode: 'development',
    say: (line) => console.log(line),
  });
  // vite.config.ts sends what is not the client's there
  process.env.API_URL = `http://127.0.0.1:${webPort}`;
  // on a server of our own: Vite's would end this process at SIGTERM before everything else is ended
  const front = createHttpServer();
  const vite = await createServer({ server: { middlewareMode: true, hmr: { server: front } }, appType: 'spa' });
  front.on('request', vite.middlewares);
  opening.onEnd(() => {
    front.close();
    front.closeAllConnections();
    return vite.close();
  });
  front.listen(frontPort, host);
  await once(front, 'listening');

  const data = path.resolve('storage/data');
  vite.watcher.add(watched);
  vite.watcher.unwatch(data);
  let waiting: NodeJS.Timeout | undefined;
  vite.watcher.on('all', (_event, file) => {
    const ours = watched.some((folder) => file.startsWith(folder + path.sep)) && !file.startsWith(data);
    if (!ours || !file.endsWith('.ts')) return;
    clearTimeout(waiting);
    waiting = setTimeout(() => {
      console.log(`${path.relative('.', file)} changed: starting web and worker anew.`);
      Promise.all([house.web.restart(), house.worker.restart()]).catch((error) => console.error(error));
    }, quietMs);
  });
  console.log(welcome(house, undefined));
} catch (error) {
  await opening.close();
  if (!signalled()) giveUp(error);
}
