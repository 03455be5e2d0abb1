/** The import directions of the house, for the whole graph. Each rule names what it forbids and why. */

const PACKAGES = {
  result: [],
  quantities: ['result'],
  signal: ['result', 'quantities'],
  models: ['result', 'quantities', 'signal'],
  shelf: ['result', 'quantities', 'signal', 'models'],
  matcher: ['result', 'quantities', 'signal', 'models', 'shelf'],
  checker: ['result', 'quantities', 'signal', 'models', 'shelf'],
  patterns: ['result', 'quantities', 'signal', 'models'],
  wording: [],
  demo: ['result', 'quantities', 'signal', 'models', 'shelf'],
  contract: ['result', 'quantities', 'signal', 'models', 'shelf'],
}

const packageRules = Object.entries(PACKAGES).map(([own, allowed]) => ({
  name: `package-${own}`,
  comment: `${own} may import ${allowed.join(', ') || 'no other package'}`,
  severity: 'error',
  from: { path: `^packages/${own}/src`, pathNot: '\\.test\\.ts$' },
  to: {
    path: '^(packages|apps|database|tests|scripts)/',
    pathNot: `^packages/(${[own, ...allowed].join('|')})/`,
  },
}))

const TESTS = '\\.test\\.ts$'
const EXPRESS =
  '^node_modules/(@types/)?(express|express-session|passport|passport-local|helmet|compression)/'
const KNEX = '^node_modules/(knex|mysql2|connect-session-knex|rate-limiter-flexible)/'

/** Within the client each layer may import those after it. */
const LAYERS = ['views', 'components', 'composables', 'stores', 'api']
const layerRules = LAYERS.slice(1).map((layer, i) => ({
  name: `client-${layer}`,
  comment: `${layer} never import what stands above them`,
  severity: 'error',
  from: { path: `^apps/catalogue/src/${layer}/`, pathNot: TESTS },
  to: { path: `^apps/catalogue/src/(${LAYERS.slice(0, i + 1).join('|')})/` },
}))

module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    {
      name: 'resolvable',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
    {
      name: 'by-name-across-workspaces',
      comment: 'Other workspaces are imported by their name, never by a path',
      severity: 'error',
      from: { path: '^(packages/[^/]+|apps/[^/]+|database)/', pathNot: TESTS },
      to: {
        path: '^(packages/[^/]+|apps/[^/]+|database)/',
        pathNot: '^$1/',
        dependencyTypesNot: ['aliased-workspace'],
      },
    },
    ...packageRules,
    {
      name: 'packages-know-no-platform',
      severity: 'error',
      from: { path: '^packages/', pathNot: TESTS },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'packages-know-no-framework',
      severity: 'error',
      from: { path: '^packages/(?!contract/)', pathNot: TESTS },
      to: { path: '^node_modules/' },
    },
    {
      name: 'contract-knows-zod-only',
      severity: 'error',
      from: { path: '^packages/contract/', pathNot: TESTS },
      to: { path: '^node_modules/', pathNot: '^node_modules/zod/' },
    },
    {
      name: 'contract-for-apps-and-tests',
      severity: 'error',
      from: { pathNot: '^(apps|tests|scripts|packages/contract)/' },
      to: { path: '^packages/contract/' },
    },
    {
      name: 'demo-for-seeds',
      comment: 'Demo data reaches the product through the seeds and the step that loads them',
      severity: 'error',
      from: {
        pathNot:
          '^(packages/demo|tests|scripts|database/seeds|apps/api/src/(prepare\\.ts|db/demo-data\\.ts))|\\.test\\.ts$|^apps/catalogue/src/fixtures/',
      },
      to: { path: '^packages/demo/' },
    },
    {
      name: 'apps-apart',
      severity: 'error',
      from: { path: '^apps/([^/]+)/' },
      to: { path: '^apps/', pathNot: '^apps/$1/' },
    },
    {
      name: 'client-without-server',
      severity: 'error',
      from: { path: '^apps/catalogue/src/', pathNot: TESTS },
      to: { path: '^database/' },
    },
    {
      name: 'nobody-imports-tests-or-scripts',
      severity: 'error',
      from: { pathNot: '^(tests|scripts)/' },
      to: { path: '^(tests|scripts)/' },
    },
    {
      name: 'migrations-import-nothing',
      severity: 'error',
      from: { path: '^database/migrations/' },
      to: { path: '^(packages|apps|database)/', pathNot: '^database/(migrations/|knexfile\\.ts)' },
    },
    {
      name: 'express-in-http',
      severity: 'error',
      from: {
        path: '^apps/api/src/',
        pathNot: '^apps/api/src/(http/|app\\.ts|compose\\.ts|db/session-store\\.ts)|\\.test\\.ts$',
      },
      to: { path: EXPRESS },
    },
    {
      name: 'knex-in-repositories',
      severity: 'error',
      from: {
        path: '^(apps|packages)/',
        pathNot:
          '^apps/api/src/(db/|compose\\.ts|(server|prepare|add-owner)\\.ts|[^/]+/(repository|[^/]+\\.repository)\\.ts)|\\.test\\.ts$',
      },
      to: { path: KNEX },
    },
    {
      name: 'routes-to-services',
      comment: 'Routes call a service; they never reach past it',
      severity: 'error',
      from: { path: '^apps/api/src/[^/]+/routes\\.ts$' },
      to: { path: '^apps/api/src/(db/|[^/]+/(repository|[^/]+\\.repository)\\.ts)' },
    },
    {
      name: 'own-repository-only',
      comment: 'Another subject is read through its service; its row types may be named',
      severity: 'error',
      from: {
        path: '^apps/api/src/([^/]+)/(service|[^/]+\\.service|mapper|[^/]+-rules|bearing)\\.ts$',
      },
      to: {
        path: '^apps/api/src/[^/]+/(repository|[^/]+\\.repository)\\.ts$',
        pathNot: '^apps/api/src/$1/',
        dependencyTypesNot: ['type-only'],
      },
    },
    {
      name: 'repositories-know-no-service',
      severity: 'error',
      from: { path: '^apps/api/src/[^/]+/(repository|[^/]+\\.repository)\\.ts$' },
      to: { path: '^apps/api/src/(http/|[^/]+/(service|[^/]+\\.service|routes|mapper)\\.ts)' },
    },
    ...layerRules,
    {
      name: 'element-plus-in-components',
      severity: 'error',
      from: {
        path: '^apps/catalogue/src/',
        pathNot: '^apps/catalogue/src/(components|views|styles|main\\.ts|App\\.vue)|\\.test\\.ts$',
      },
      to: { path: '^node_modules/(element-plus|@element-plus)/' },
    },
    {
      name: 'declared',
      comment: 'What is imported stands in the package.json of the workspace',
      severity: 'error',
      from: { path: '^(apps|packages|database)/', pathNot: '\\.test\\.ts$|vite\\.config\\.ts$' },
      to: { dependencyTypes: ['npm-no-pkg', 'npm-unknown'] },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(^|/)(dist|coverage|\\.data|node_modules/\\.cache)/' },
    tsPreCompilationDeps: true,
    combinedDependencies: true,
    tsConfig: { fileName: 'tsconfig.base.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'types', 'node', 'default'],
      mainFields: ['module', 'main', 'types'],
      extensions: ['.ts', '.mts', '.mjs', '.js', '.vue', '.d.ts', '.json'],
    },
  },
}
