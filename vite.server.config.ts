import { defineConfig } from 'vite';

/** The server's processes as bundles of our own code; modules stay where they are. Each starts in well under a second. */
export default defineConfig({
  publicDir: false,
  build: {
    ssr: true,
    target: 'node20',
    outDir: 'dist/server',
    emptyOutDir: true,
    sourcemap: true,
    rolldownOptions: {
      input: {
        main: 'server/main.ts',
        worker: 'server/worker.ts',
        launch: 'server/start/launch.ts',
        prepare: 'server/start/prepare.ts',
        leash: 'server/start/leash.ts',
        fakeStore: 'storage/local/main.ts',
      },
      output: { entryFileNames: '[name].js', chunkFileNames: 'parts/[name]-[hash].js' },
    },
  },
});
