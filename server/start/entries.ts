import path from 'node:path';

/** Node's arguments for each process that a launcher starts. Paths are from the clone's folder, where every command runs. */
export type Entries = Record<'web' | 'worker' | 'prepare' | 'fakeStore', string[]>;

const built = (name: string) => path.resolve('dist/server', `${name}.js`);

export const builtEntries: Entries = {
  web: ['--enable-source-maps', '--import', built('leash'), built('main')],
  worker: ['--enable-source-maps', '--import', built('leash'), built('worker')],
  prepare: ['--enable-source-maps', '--import', built('leash'), built('prepare')],
  fakeStore: ['--import', built('leash'), built('fakeStore')],
};

const source = (file: string) => [
  '--import',
  'tsx',
  '--import',
  path.resolve('server/start/leash.ts'),
  path.resolve(file),
];

export const sourceEntries: Entries = {
  web: source('server/main.ts'),
  worker: source('server/worker.ts'),
  prepare: source('server/start/prepare.ts'),
  fakeStore: source('storage/local/main.ts'),
};
