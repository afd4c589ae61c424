/** The arrows of the rooms, default deny: what is not listed as allowed is refused. */
const spec = '\\.(spec|test)\\.ts$';
module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    { name: 'not-resolved', severity: 'error', from: {}, to: { couldNotResolve: true } },
    {
      name: 'features-keep-to-themselves',
      comment: 'A feature of the client never imports another feature.',
      severity: 'error',
      from: { path: '^client/src/app/features/([^/]+)/' },
      to: { path: '^client/src/app/features/([^/]+)/', pathNot: '^client/src/app/features/$1/' },
    },
    {
      name: 'only-repositories-know-drizzle',
      severity: 'error',
      from: { path: '^api/', pathNot: `^api/platform/db/|repository\\.ts$|${spec}` },
      to: { path: 'node_modules/(drizzle-orm|pg)/' },
    },
    {
      name: 'routes-do-not-reach-repositories',
      comment: 'routes → use cases → repositories → schema.',
      severity: 'error',
      from: { path: '^api/features/.*/routes\\.ts$' },
      to: { path: 'repository\\.ts$|^api/platform/db/' },
    },
    {
      name: 'use-cases-do-not-know-http',
      severity: 'error',
      from: { path: '^api/features/', pathNot: `routes\\.ts$|${spec}` },
      to: { path: 'node_modules/express/|^api/platform/http/' },
    },
  ],
  allowed: [
    { from: { path: '^client/' }, to: { path: '^client/src/app/(core|ui)/|^shared/' } },
    {
      from: { path: '^client/src/app/features/([^/]+)/' },
      to: { path: '^client/src/app/features/$1/' },
    },
    { from: { path: '^client/src/(main|app/app[^/]*)\\.ts$' }, to: { path: '^client/src/app/' } },
    { from: { path: '^api/' }, to: { path: '^api/|^shared/' } },
    { from: { path: '^api/(main|app|local/)' }, to: { path: '^seeds/' } },
    { from: { path: '^shared/circuit/' }, to: { path: '^shared/circuit/' } },
    { from: { path: '^shared/solver/' }, to: { path: '^shared/(circuit|solver)/' } },
    { from: { path: '^shared/diagnosis/' }, to: { path: '^shared/(circuit|solver|diagnosis)/' } },
    { from: { path: '^shared/trees/' }, to: { path: '^shared/(circuit|solver|diagnosis|trees)/' } },
    { from: { path: '^shared/cases/' }, to: { path: '^shared/(circuit|diagnosis|cases)/' } },
    { from: { path: '^shared/search/' }, to: { path: '^shared/search/' } },
    { from: { path: '^shared/contract/' }, to: { path: '^shared/' } },
    { from: { path: '^seeds/' }, to: { path: '^(seeds|shared|api/platform)/' } },
    { from: { path: '^tests/' }, to: { path: '^(tests|client|api|shared|seeds)/' } },
    { from: { path: '^(vitest|drizzle)\\.config\\.ts$' }, to: {} },
    {
      from: { path: '^(client|api|shared|seeds|tests)/' },
      to: { path: 'node_modules', dependencyTypesNot: ['npm-no-pkg', 'npm-unknown'] },
    },
    {
      from: { path: '^(api|seeds|tests|shared/.*\\.spec\\.ts$)' },
      to: { dependencyTypes: ['core'] },
    },
  ],
  allowedSeverity: 'error',
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(dist|\\.angular|tests/arrows/planted)' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
      mainFields: ['module', 'main', 'types'],
    },
  },
};
