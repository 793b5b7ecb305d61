import { defineConfig } from 'vitest/config';

/** What is measured and never asserted on time: `npm run bench`. */
export default defineConfig({
  test: {
    include: ['tests/bench/**/*.bench.ts'],
    globalSetup: ['tests/support/setupStores.ts'],
    testTimeout: 600_000,
    hookTimeout: 600_000,
    maxWorkers: 1,
    pool: 'forks',
  },
});
