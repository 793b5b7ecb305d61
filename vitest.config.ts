import { defineConfig } from 'vitest/config';

/** The suites by what they need: `domain` and `standards` nothing, `api` and `jobs` a database and a store, `start` Debian's programs. */
const suite = (name: string, more: { needsStores?: boolean; timeoutMs?: number } = {}) => ({
  test: {
    name,
    include: [`tests/${name}/**/*.test.ts`],
    testTimeout: more.timeoutMs ?? 10_000,
    hookTimeout: Math.max(30_000, more.timeoutMs ?? 0),
    globalSetup: more.needsStores ? ['tests/support/setupStores.ts'] : [],
  },
});

export default defineConfig({
  test: {
    // two cores, and ffmpeg wants one
    maxWorkers: 2,
    pool: 'forks',
    env: { AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true' },
    projects: [
      suite('domain'),
      suite('standards'),
      suite('api', { needsStores: true, timeoutMs: 20_000 }),
      suite('jobs', { needsStores: true, timeoutMs: 120_000 }),
      suite('start', { timeoutMs: 120_000 }),
    ],
  },
});
