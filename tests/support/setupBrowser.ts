import { fork } from 'node:child_process';
import { once } from 'node:events';
import { closeSync, openSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { z } from 'zod';
import { openRunFolder } from './runFolder';

const Ready = z.object({
  url: z.string(),
  mailPage: z.string(),
  databaseUrl: z.string(),
  signIns: z.array(z.object({ role: z.string(), email: z.string(), password: z.string() })),
});
export type Running = z.infer<typeof Ready>;

/** A first start makes a cluster, migrates and seeds. */
const patienceMs = 180_000;

/**
 * The whole built product for one run of the browser suite: its own folder, database, store, mailbox and ports, with the
 * demo team in it. The suite reads BASE_URL, MAIL_URL (/messages.json), DATABASE_URL and SIGN_INS (JSON) from the
 * environment. Playwright calls what this gives back at the end.
 */
export async function setupBrowser(): Promise<() => Promise<void>> {
  const run = await openRunFolder('browser');
  const logFile = path.join(run.folder, 'launch.log');
  const log = openSync(logFile, 'a');
  const { DATABASE_URL, S3_ENDPOINT, S3_BUCKET, SMTP_URL, PUBLIC_URL, HOST, ...env } = process.env;
  const launcher = fork(path.resolve('dist/server/launch.js'), {
    env: { ...env, PORT: '0', TAPELINE_DATA: run.folder, TAPELINE_DISPOSABLE: 'yes' },
    stdio: ['ignore', log, log, 'ipc'],
  });
  closeSync(log);
  const close = async () => {
    if (launcher.exitCode === null && launcher.signalCode === null) {
      const gone = once(launcher, 'exit');
      launcher.kill('SIGTERM');
      await gone;
    }
    await run.remove();
  };
  try {
    const running = await untilReady(launcher, logFile);
    process.env.BASE_URL = running.url;
    process.env.MAIL_URL = running.mailPage;
    process.env.DATABASE_URL = running.databaseUrl;
    process.env.SIGN_INS = JSON.stringify(running.signIns);
    return close;
  } catch (error) {
    await close();
    throw error;
  }
}

async function untilReady(launcher: ReturnType<typeof fork>, logFile: string): Promise<Running> {
  const signal = AbortSignal.timeout(patienceMs);
  const [message] = await Promise.race([
    once(launcher, 'message', { signal }),
    once(launcher, 'exit', { signal }).then(() => {
      throw new Error(`The product did not start:\n${readFileSync(logFile, 'utf8')}`);
    }),
  ]);
  return Ready.parse(message);
}

// biome-ignore lint/style/noDefaultExport: Playwright's globalSetup takes a file's default
export default setupBrowser;
