import { randomBytes } from 'node:crypto';
import { inject } from 'vitest';
import { makeBucket } from '../../storage/local/bucket';

export type FreshStore = {
  endpoint: string;
  publicEndpoint: string;
  region: string;
  bucket: string;
  accessKeyId: string;
  secretAccessKey: string;
};

/** An empty bucket of one's own in this run's fake store, with the shape of the configuration's `store`. */
export async function freshStore(): Promise<FreshStore> {
  const { store } = inject('stores');
  const bucket = `test-${randomBytes(8).toString('hex')}`;
  await makeBucket(store, bucket, ['http://127.0.0.1', 'http://localhost']);
  return { ...store, publicEndpoint: store.endpoint, bucket };
}

/** The same as variables of the environment, for processes. */
export function storeEnvironment(store: FreshStore) {
  return {
    S3_ENDPOINT: store.endpoint,
    S3_REGION: store.region,
    S3_BUCKET: store.bucket,
    S3_ACCESS_KEY_ID: store.accessKeyId,
    S3_SECRET_ACCESS_KEY: store.secretAccessKey,
  };
}
