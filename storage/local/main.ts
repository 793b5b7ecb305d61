import { z } from 'zod';
import { startFakeStore } from './fakeStore';

/** The fake store as a process of its own, so that uploads never hold up the launcher; its address goes to the parent. */
const options = z
  .object({ folder: z.string(), port: z.int(), accessKeyId: z.string(), secretAccessKey: z.string() })
  .parse(JSON.parse(process.env.FAKE_STORE ?? '{}'));

const store = await startFakeStore(options);
process.send?.({ endpoint: store.endpoint });

process.once('SIGTERM', async () => {
  await store.close();
  process.exit(0);
});
