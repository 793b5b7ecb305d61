import { createServer } from 'node:http';
import { createApp } from './app';
import { readConfig } from './config';
import { openLog } from './middleware/log';
import { closeDatabase, connectDatabase } from './models/database';
import { connectServices } from './services/context';

/** The web process. */
const config = readConfigOrStop();
const log = openLog(config.logLevel, 'web');
connectDatabase(config.databaseUrl, config.databasePool);
const { store } = connectServices(config);
const app = await createApp(config, log);
const server = createServer(app.express);
// longer than a balancer keeps an idle connection, so that it never meets a closed one
server.keepAliveTimeout = 65_000;
server.headersTimeout = 70_000;
server.listen(config.port, config.host, () => {
  log.info({ port: config.port }, 'listening');
  process.send?.({ ready: true, port: config.port });
});
server.on('error', (error) => {
  process.stderr.write(`Tapeline cannot listen on ${config.host}:${config.port}: ${error.message}\n`);
  process.exit(1);
});

let stopping = false;
async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  const stopped = new Promise((resolve) => server.close(resolve));
  await app.close();
  server.closeIdleConnections();
  const patience = setTimeout(() => server.closeAllConnections(), 3000);
  await stopped;
  clearTimeout(patience);
  await closeDatabase();
  store.close();
  process.exit(0);
}
process.on('SIGTERM', () => void stop());
process.on('SIGINT', () => void stop());
// a parent that died leaves nothing behind
process.on('disconnect', () => void stop());

function readConfigOrStop() {
  try {
    return readConfig(process.env);
  } catch (error) {
    process.stderr.write(`${(error as Error).message}\n`);
    return process.exit(2);
  }
}
