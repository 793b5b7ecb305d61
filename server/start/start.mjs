// @ts-check
import path from 'node:path';
import { bootstrap, root } from './bootstrap.mjs';
import { CannotStart, giveUp } from './cannotStart.mjs';
import { livingOwnerOf } from './lock.mjs';

/** `npm start`: makes the machine ready with Node alone, then hands over to the built launcher in this same process. */
try {
  // before anything is built under a running one
  const running = livingOwnerOf(path.join(root, 'storage/data/running'));
  if (running) {
    const { url } = /** @type {{ url?: string }} */ (running.note ?? {});
    throw new CannotStart(
      `Tapeline runs in this folder already${url ? `: ${url}` : ''} (process ${running.pid}). End that one first, or use it.`,
    );
  }
  await bootstrap();
  await import(path.join(root, 'dist/server/launch.js'));
} catch (error) {
  giveUp(error);
}
