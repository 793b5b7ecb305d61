import { randomBytes } from 'node:crypto';
import path from 'node:path';
import type { TestProject } from 'vitest/node';
import { migrate } from '../../server/migrations/migrate';
import { startCluster } from '../../server/start/postgres/cluster';
import { makeDatabase } from '../../server/start/postgres/databases';
import { startFakeStore } from '../../storage/local/fakeStore';
import { openRunFolder } from './runFolder';

export type Stores = {
  /** the test cluster's own database, from which others are made */
  serverUrl: string;
  /** a migrated database that nobody connects to */
  template: string;
  store: { endpoint: string; region: string; accessKeyId: string; secretAccessKey: string };
};

declare module 'vitest' {
  interface ProvidedContext {
    stores: Stores;
  }
}

type Shared = { users: number; opened: Promise<{ stores: Stores; close(): Promise<void> }> };

/** The projects of one run share these; each project loads this file anew, so they meet at the process. */
const meeting = process as typeof process & { tapelineTestStores?: Shared | undefined };

/** Brings up one test cluster with a migrated template, and one fake store, for all suites of this run. */
export async function setup(project: TestProject) {
  meeting.tapelineTestStores ??= { users: 0, opened: open() };
  const shared = meeting.tapelineTestStores;
  shared.users++;
  const { stores } = await shared.opened;
  project.provide('stores', stores);
}

/** The last suite to end takes all down. */
export async function teardown() {
  const shared = meeting.tapelineTestStores;
  if (!shared || --shared.users > 0) return;
  meeting.tapelineTestStores = undefined;
  await (await shared.opened).close();
}

async function open() {
  const run = await openRunFolder('stores');
  const access = { accessKeyId: 'test', secretAccessKey: randomBytes(24).toString('base64url') };
  const [cluster, store] = await Promise.all([
    startCluster(run.folder, 'disposable'),
    startFakeStore({ folder: path.join(run.folder, 'store'), port: 0, ...access }),
  ]);
  const template = 'template_tapeline';
  await makeDatabase(cluster.urlOf('postgres'), template);
  await migrate(cluster.urlOf(template));
  return {
    stores: {
      serverUrl: cluster.urlOf('postgres'),
      template,
      store: { endpoint: store.endpoint, region: 'us-east-1', ...access },
    },
    async close() {
      await store.close();
      await run.remove();
    },
  };
}
