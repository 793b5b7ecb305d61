import { readConfig } from './config';
import { allHandlers } from './jobs/handlers/all';
import { startQueue } from './jobs/queue';
import { openLog } from './middleware/log';
import { closeDatabase, connectDatabase } from './models/database';
import { connectServices } from './services/context';

/** The worker process: the only one that runs ffmpeg. */
const config = readConfigOrStop();
const log = openLog(config.logLevel, 'worker');
connectDatabase(config.databaseUrl, config.workerJobs * 2 + 2);
const { store } = connectServices(config);
const queue = await startQueue(config.databaseUrl, allHandlers(config), config.workerJobs, log);
log.info({ jobs: config.workerJobs }, 'taking jobs');
process.send?.({ ready: true });

let stopping = false;
async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  await queue.stop();
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
