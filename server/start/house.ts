import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { CannotStart } from './cannotStart.mjs';
import type { Entries } from './entries';
import { localDatabase, localMail, localStore, type Wanted } from './localParts';
import { type Held, takeLock } from './lock.mjs';
import { endOfLog, openLog } from './logFiles';
import { prepareData, type SignIn } from './prepareData';
import { secretsIn } from './secrets';
import { step } from './step.mjs';
import { keepRunning, type Supervised } from './supervisor';

// the pinned version of the SDK works on this Node; its notice about later ones is for us and not for who starts this
process.env.AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED = 'true';

type Plan = {
  entries: Entries;
  dataFolder: string;
  /** where the web process listens */
  host: string;
  webPort: number;
  /** where browsers come in; the same port unless something stands in front */
  frontPort: number;
  mode: 'production' | 'development';
  say(line: string): void;
};

export type House = {
  url: string;
  /** where mail can be read, when it is ours */
  mailPage: string | undefined;
  databaseUrl: string;
  signIns: SignIn[];
  web: Supervised;
  worker: Supervised;
};

/** Everything that one start brought up, in order, so that it can be taken down in the other order. */
export class Opening {
  private readonly abort = new AbortController();
  private readonly ends: (() => Promise<unknown> | unknown)[] = [];
  private opening: Promise<unknown> = Promise.resolve();
  private closing: Promise<void> | undefined;

  /** @throws CannotStart where the folder is in use or something that was asked for cannot be had */
  open(plan: Plan): Promise<House> {
    const house = this.bringUp(plan);
    this.opening = house.catch(() => {});
    return house;
  }

  /** Something more that ends with the house, before everything that was there already. */
  onEnd = (end: () => Promise<unknown> | unknown) => {
    this.ends.push(end);
  };

  /** Ends what was started and nothing else, within 10 s; asked twice, does it once. */
  close(): Promise<void> {
    this.closing ??= (async () => {
      this.abort.abort();
      // a step under way may have started something that it has not told of yet
      await Promise.race([this.opening, pause(1500)]);
      for (const end of this.ends.toReversed()) await Promise.resolve(end()).catch((error) => console.error(error));
    })();
    return this.closing;
  }

  private async bringUp(plan: Plan): Promise<House> {
    const { entries, dataFolder, say } = plan;
    mkdirSync(dataFolder, { recursive: true });
    const lock = this.takeFolder(dataFolder);
    const url = process.env.PUBLIC_URL || `http://localhost:${plan.frontPort}`;
    const wanted: Wanted = {
      dataFolder,
      durability: process.env.TAPELINE_DISPOSABLE ? 'disposable' : 'kept',
      fakeStore: entries.fakeStore,
      origins: [...new Set([url, `http://localhost:${plan.frontPort}`, `http://127.0.0.1:${plan.frontPort}`])],
      say,
      onEnd: this.onEnd,
    };
    const [database, store, { mailPage, ...mail }] = await all([
      this.step('Starting the database', say, () => localDatabase(process.env, wanted)),
      this.step('Starting the object store', say, () => localStore(process.env, wanted)),
      this.step('Starting the mailbox', say, () => localMail(process.env, wanted)),
    ]);
    const { SESSION_SECRET, MEDIA_SECRET } = secretsIn(dataFolder);
    const env: Record<string, string | undefined> = {
      SESSION_SECRET,
      MEDIA_SECRET,
      NODE_ENV: plan.mode,
      PUBLIC_URL: url,
      // in development Vite stands in front with the pages
      ...(plan.mode === 'production' ? { CLIENT_DIR: path.resolve('dist/client') } : {}),
      ...process.env,
      ...database,
      ...store,
      ...mail,
      HOST: plan.host,
      PORT: String(plan.webPort),
    };
    const signIns = await this.step('Preparing the database', say, () =>
      prepareData(entries.prepare, env, this.abort.signal),
    );
    const run = (name: 'web' | 'worker', onMessage?: () => void) => {
      const output = plan.mode === 'development' ? ('inherit' as const) : openLog(dataFolder, name);
      const lastWords = () => (output === 'inherit' ? '' : ` It said last:\n${endOfLog(dataFolder, name, 8)}`);
      const program = { name: `The ${name} process`, args: entries[name], env, output, lastWords };
      return keepRunning({ ...program, ...(onMessage ? { onMessage } : {}) }, say);
    };
    let listening = false;
    const web = run('web', () => {
      listening = true;
    });
    const worker = run('worker');
    this.onEnd(() => Promise.all([web.stop(4000), worker.stop(4000)]));
    await this.step('Starting the web process', say, () => this.untilHealthy(plan, web, () => listening));
    const databaseUrl = env.DATABASE_URL ?? '';
    lock.describe({ url, mailPage });
    return { url, mailPage, databaseUrl, signIns, web, worker };
  }

  private takeFolder(dataFolder: string): Held {
    const taken = takeLock(path.join(dataFolder, 'running'));
    if ('owner' in taken) {
      throw new CannotStart(
        `Tapeline runs in this folder already (process ${taken.owner.pid}). End that one first, or use it.`,
      );
    }
    this.onEnd(taken.held.release);
    return taken.held;
  }

  private async step<T>(what: string, say: Plan['say'], work: () => Promise<T>): Promise<T> {
    this.abort.signal.throwIfAborted();
    const result = await step(what, work, say);
    this.abort.signal.throwIfAborted();
    return result;
  }

  private async untilHealthy({ host, webPort, mode }: Plan, web: Supervised, isListening: () => boolean) {
    const address = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host;
    const health = `http://${address.includes(':') ? `[${address}]` : address}:${webPort}/api/health`;
    const over = Date.now() + 60_000;
    while (!this.abort.signal.aborted) {
      // its own word first: something else may answer at that address
      if (isListening() && (await answers(health))) return;
      // in development the next change may mend it
      const hopeless = mode === 'production' && (web.failures >= 3 || Date.now() > over);
      if (hopeless) throw new CannotStart(`The web process does not answer at ${health}.`);
      await pause(100);
    }
  }
}

async function answers(address: string) {
  const answer = await fetch(address, { signal: AbortSignal.timeout(2000) }).catch(() => undefined);
  return answer?.ok ?? false;
}

/** Waits for all even where one fails, so that nothing is still starting when the others are ended. */
async function all<A, B, C>(work: [Promise<A>, Promise<B>, Promise<C>]): Promise<[A, B, C]> {
  await Promise.allSettled(work);
  return Promise.all(work);
}
