/** Directions of imports, by pattern: a new feature is guarded at birth. See DEVELOPERS.md. */
/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'domain-is-pure',
      severity: 'error',
      from: { path: '^shared/(domain|drawing)/', pathNot: '\\.test(-d)?\\.ts$' },
      to: { pathNot: '^(shared/(domain|drawing|reference)/|node_modules/(zod|convert-units)/)' },
    },
    {
      name: 'reference-is-data',
      severity: 'error',
      from: { path: '^shared/reference/', pathNot: '\\.test\\.ts$' },
      to: { pathNot: '^(shared/reference/|node_modules/zod/)' },
    },
    {
      name: 'wire-knows-only-shared',
      severity: 'error',
      from: { path: '^shared/api/', pathNot: '\\.test\\.ts$' },
      to: { pathNot: '^(shared/|node_modules/zod/)' },
    },
    {
      name: 'domain-does-not-know-the-wire',
      severity: 'error',
      from: { path: '^shared/(domain|drawing|reference)/' },
      to: { path: '^shared/api/' },
    },
    { name: 'client-never-imports-server', severity: 'error', from: { path: '^src/' }, to: { path: '^(server|drizzle|tests)/' } },
    {
      name: 'server-never-imports-client',
      severity: 'error',
      from: { path: '^server/', pathNot: '\\.test\\.ts$' },
      to: { path: '^(src|tests)/' },
    },
    {
      name: 'server-tests-use-only-the-set-up',
      severity: 'error',
      from: { path: '^server/.*\\.test\\.ts$' },
      to: { path: '^(src|tests)/', pathNot: '^tests/setup/' },
    },
    {
      name: 'client-features-meet-at-queries',
      severity: 'error',
      from: { path: '^src/features/([^/]+)/' },
      to: { path: '^src/features/', pathNot: '^src/features/($1/|[^/]+/queries\\.ts$)' },
    },
    { name: 'client-flows-one-way', severity: 'error', from: { path: '^src/(ui|lib)/' }, to: { path: '^src/(features|app)/' } },
    { name: 'features-do-not-know-app', severity: 'error', from: { path: '^src/features/' }, to: { path: '^src/app/' } },
    { name: 'lib-does-not-know-ui', severity: 'error', from: { path: '^src/lib/' }, to: { path: '^src/ui/' } },
    {
      name: 'ui-does-not-know-lib-or-router',
      severity: 'error',
      from: { path: '^src/ui/' },
      to: { path: '^(src/lib/|node_modules/react-router/)' },
    },
    {
      name: 'server-flows-one-way',
      severity: 'error',
      from: { path: '^server/(http|files|mail)/' },
      to: { path: '^server/(features/|app\\.ts|main\\.ts)' },
    },
    {
      name: 'database-does-not-know-features',
      severity: 'error',
      from: { path: '^server/db/', pathNot: '^server/db/demo/' },
      to: { path: '^server/(features/|app\\.ts|main\\.ts)' },
    },
    {
      name: 'server-features-meet-at-queries',
      severity: 'error',
      from: { path: '^server/features/([^/]+)/', pathNot: '\\.test\\.ts$' },
      to: { path: '^server/features/', pathNot: '^server/features/($1/|[^/]+/queries\\.ts$)' },
    },
    {
      name: 'only-queries-touch-tables',
      severity: 'error',
      from: { path: '^server/features/', pathNot: '/[^/]*queries\\.ts$|\\.test\\.ts$' },
      to: { path: '^(server/db/schema|node_modules/drizzle-orm)', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'no-orphans',
      severity: 'error',
      from: { orphan: true, path: '^(src|server|shared)/', pathNot: '\\.(test|d)\\.tsx?$|main\\.tsx?$|worker\\.ts$|start\\.mjs$' },
      to: {},
    },
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^(dist|data|drizzle)/' },
  },
}
