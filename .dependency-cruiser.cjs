/** The arrows between the house's parts (DEVELOPERS.md); tests may reach everything. */
const only = (name, comment, from, allowed) => ({
  name,
  comment,
  severity: 'error',
  from: { path: from },
  to: { pathNot: allowed, dependencyTypesNot: ['core'] },
});
const never = (name, comment, from, to) => ({ name, comment, severity: 'error', from, to });

module.exports = {
  forbidden: [
    never('no-circles', 'Two files that need each other are one idea or three.', {}, { circular: true }),
    never('resolvable', 'What is imported exists.', {}, { couldNotResolve: true }),
    never(
      'declared',
      'A module is in package.json; what runs is no development module.',
      { path: '^(src|shared|server|storage)/', pathNot: '^server/start/dev\\.(ts|mjs)$' },
      { dependencyTypes: ['npm-no-pkg', 'npm-unknown', 'npm-dev'], pathNot: 'node_modules/@types/' },
    ),
    only('shared-alone', 'shared imports zod and itself.', '^shared/', ['^shared/', '^node_modules/zod/']),
    never('shared-no-core', 'shared runs in the browser too.', { path: '^shared/' }, { dependencyTypes: ['core'] }),
    never('client', 'src reaches shared alone.', { path: '^src/' }, { path: '^(server|storage|tests)/' }),
    never(
      'client-lib',
      'lib and components know nothing above them.',
      { path: '^src/(lib|components)/' },
      { path: '^src/(app|pages|features)/' },
    ),
    never('client-lib-components', 'lib draws nothing.', { path: '^src/lib/' }, { path: '^src/components/' }),
    never('client-features', 'A feature knows no page.', { path: '^src/features/' }, { path: '^src/(app|pages)/' }),
    never(
      'client-features-apart',
      'A feature never imports another feature: a page composes them.',
      { path: '^src/features/([^/]+)/' },
      { path: '^src/features/', pathNot: '^src/features/$1/' },
    ),
    never('client-pages', 'A page knows no layout of the application.', { path: '^src/pages/' }, { path: '^src/app/' }),
    never('server-no-client', 'The server knows no page.', { path: '^(server|storage)/' }, { path: '^(src|tests)/' }),
    never(
      'routes-through-services',
      'A route asks a service; readiness alone asks the database.',
      { path: '^server/routes/', pathNot: '^server/routes/health\\.ts$' },
      { path: '^server/(models|migrations|media|jobs/handlers|demo|start)/' },
    ),
    never(
      'services-no-http',
      'Services know no Express and no route.',
      { path: '^server/services/' },
      { path: ['^server/(routes|middleware|media|start|demo)/', '^server/jobs/handlers/', '^node_modules/express'] },
    ),
    never(
      'models-alone',
      'Models know the database and shared rules.',
      { path: '^server/models/' },
      { path: '^server/(?!models/)', pathNot: '^server/config' },
    ),
    never(
      'handlers-from-worker',
      'Handlers run in the worker process alone.',
      { path: '^(server|storage)/', pathNot: ['^server/worker\\.ts$', '^server/jobs/handlers/'] },
      { path: '^server/jobs/handlers/' },
    ),
    never(
      'media-no-database',
      'media knows files and programs.',
      { path: '^server/media/' },
      {
        path: [
          '^server/(models|services|routes|jobs|middleware|demo|start)/',
          '^storage/',
          '^node_modules/(sequelize|pg)/',
        ],
      },
    ),
    never(
      'media-from-worker',
      'Only the worker runs ffmpeg: media is reached from handlers and the demo team.',
      { path: '^(server|storage)/', pathNot: ['^server/(media|jobs/handlers|demo)/', '^server/worker\\.ts$'] },
      // what went wrong with a file is a value, read by whoever tells it
      { path: '^server/media/', pathNot: '^server/media/mediaFault\\.ts$' },
    ),
    never(
      'start-from-commands',
      'What brings up a bare machine is reached from the commands alone.',
      { path: '^(server|storage)/', pathNot: '^server/start/' },
      { path: '^server/start/' },
    ),
    never(
      'demo-from-seed',
      'The demo team is reached from the seed and the job that films it.',
      { path: '^(server|storage)/', pathNot: ['^server/demo/', '^server/start/', '^server/jobs/handlers/'] },
      { path: '^server/demo/' },
    ),
    never(
      'fake-from-start',
      'The fake store is for this machine alone.',
      { path: '^(server|storage)/', pathNot: ['^server/start/', '^storage/local/'] },
      { path: '^storage/local/' },
    ),
    never('storage-alone', 'The store knows no database.', { path: '^storage/' }, { path: '^server/(?!config)' }),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(dist|storage/data|coverage)' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      extensions: ['.ts', '.tsx', '.mjs', '.js', '.cjs', '.json', '.d.ts', '.d.mts'],
      conditionNames: ['import', 'node', 'default', 'types'],
    },
  },
};
