import { randomBytes } from 'node:crypto';
import { inject } from 'vitest';
import { copyDatabase, dropDatabase } from '../../server/start/postgres/databases';

export type FreshDatabase = { url: string; drop(): Promise<void> };

/**
 * A migrated, empty database of one's own, in some 50 ms. For the suites `api` and `jobs`.
 * Close every pool before dropping it; all go with the cluster at the end in any case.
 */
export async function freshDatabase(): Promise<FreshDatabase> {
  const { serverUrl, template } = inject('stores');
  const name = `test_${randomBytes(8).toString('hex')}`;
  await copyDatabase(serverUrl, template, name);
  const url = new URL(serverUrl);
  url.pathname = `/${name}`;
  return { url: url.href, drop: () => dropDatabase(serverUrl, name) };
}
