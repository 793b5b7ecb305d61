// @ts-check
import { bootstrap } from './bootstrap.mjs';
import { giveUp } from './cannotStart.mjs';

/** `npm run dev`: the same local parts, pages with hot reload, server restarted on change; nothing is built. */
try {
  await bootstrap({ build: false });
  const { register } = await import('tsx/esm/api');
  register();
  await import('./dev.ts');
} catch (error) {
  giveUp(error);
}
