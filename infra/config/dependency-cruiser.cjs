/**
 * Import rules between workspaces and layers. What no rule in `allowed` names is not allowed.
 *
 * @type {import('dependency-cruiser').IConfiguration}
 */
const test = String.raw`\.(?:test|e2e)\.tsx?$|/testing/`;

/** May `from` (layers of the API) import `to` (layers of the API)? */
function apiLayer(from, to) {
  return { from: { path: `^api/src/(?:${from})(?:/|\\.ts$)` }, to: { path: `^api/src/(?:${to})(?:/|\\.ts$)` } };
}

module.exports = {
  forbidden: [
    {
      name: 'no-cycles',
      severity: 'error',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'declared-packages',
      comment: 'A workspace names the packages it uses in its package.json.',
      severity: 'error',
      from: {},
      to: { dependencyTypes: ['npm-no-pkg', 'npm-unknown'] },
    },
    { name: 'resolvable', severity: 'error', from: {}, to: { couldNotResolve: true } },
    {
      name: 'workspaces-by-package-name',
      comment: 'Another workspace is reached by its package name and what its exports map offers.',
      severity: 'error',
      from: { path: '^(shared|api|web|infra|e2e)/' },
      to: {
        path: '^(?:shared|api|web|infra|e2e)/',
        pathNot: '^$1/',
        dependencyTypesNot: ['aliased-workspace', 'npm', 'npm-dev', 'localmodule', 'undetermined'],
      },
    },
    {
      name: 'no-tests-in-product',
      severity: 'error',
      from: { pathNot: test },
      to: { path: `^(?:shared|api|web)/.*(?:${test})` },
    },
    {
      name: 'registry-without-schemas',
      comment: 'The registry is in the first load of the web, the schema library must not be.',
      severity: 'error',
      from: { path: '^shared/src/(?:measures/|units|format|calendar)', pathNot: test },
      to: { path: 'node_modules/zod/' },
    },
    {
      name: 'feature-alone',
      comment: 'A feature never imports another feature.',
      severity: 'error',
      from: { path: '^web/src/features/([^/]+)/' },
      to: { path: '^web/src/features/', pathNot: '^web/src/features/$1/' },
    },
    {
      name: 'no-fetching-in-pieces',
      comment: 'Pieces of the screen and charts get their data from whoever shows them.',
      severity: 'error',
      from: { path: '^web/src/(?:ui|charts)/', pathNot: test },
      to: { path: 'node_modules/@tanstack/react-query/|^web/src/lib/(?:api-fetch|query-client)' },
    },
    {
      name: 'pure-physiology',
      severity: 'error',
      from: { path: '^api/src/(?:physiology|scheduling)/', pathNot: test },
      to: { dependencyTypes: ['npm', 'npm-dev', 'core'], pathNot: '^shared/' },
    },
    {
      name: 'pure-shared',
      severity: 'error',
      from: { path: '^shared/src/', pathNot: test },
      to: { dependencyTypes: ['core'] },
    },
  ],
  allowedSeverity: 'error',
  allowed: [
    // Tests may use whatever they test.
    { from: { path: test }, to: {} },
    // shared: its own files and zod.
    { from: { path: '^shared/src/' }, to: { path: '^shared/src/|node_modules/zod/' } },
    // api: packages and shared from anywhere, layers downward.
    { from: { path: '^api/src/' }, to: { path: '^shared/src/|node_modules/', dependencyTypesNot: ['core'] } },
    { from: { path: '^api/src/' }, to: { dependencyTypes: ['core'] } },
    { from: { path: '^api/src/([^/]+)/' }, to: { path: '^api/src/$1/' } },
    { from: { path: '^api/src/[^/]+\\.ts$' }, to: { path: '^api/src/' } },
    // Errors and the clock belong to no layer.
    {
      from: { path: '^api/src/', pathNot: '^api/src/(?:physiology|scheduling)/' },
      to: { path: '^api/src/(?:errors|time)/' },
    },
    // So do the signed-in person and the context of a command, which are types.
    {
      from: { path: '^api/src/(?:auth|audit|time|jobs|mail)/' },
      to: { path: '^api/src/(?:policies/actor|services/command-context)\\.ts$' },
    },
    apiLayer('db', 'models|errors'),
    apiLayer('flags', 'models'),
    apiLayer('routes', 'http|services|queries|models|policies|presenters|auth|audit|physiology|config|db'),
    apiLayer('http', 'auth|audit|policies|config|db|models|services|queries'),
    apiLayer('policies', 'models|auth'),
    apiLayer(
      'services',
      'presenters|flags|queries|policies|models|physiology|scheduling|db|audit|auth|config|jobs|mail|payments|letters',
    ),
    apiLayer('queries', 'policies|models|physiology|db'),
    apiLayer('presenters', 'flags|policies|models|physiology|queries|services|auth'),
    apiLayer('models', 'db|physiology'),
    apiLayer('migrations', 'db'),
    apiLayer('auth', 'models|db|config|audit'),
    apiLayer('audit', 'models|db'),
    apiLayer('jobs|mail|payments|letters|fhir', 'services|queries|models|db|config|physiology|scheduling'),
    // web: app -> features -> charts, ui, lib.
    { from: { path: '^web/(?:src/|vite\\.config)' }, to: { path: '^shared/src/|node_modules/' } },
    { from: { path: '^web/src/app/' }, to: { path: '^web/src/' } },
    { from: { path: '^web/src/[^/]+\\.tsx?$' }, to: { path: '^web/src/' } },
    { from: { path: '^web/src/features/' }, to: { path: '^web/src/(?:features|charts|ui|lib|config|styles|i18n)/' } },
    { from: { path: '^web/src/charts/' }, to: { path: '^web/src/(?:charts|ui|lib|i18n)/' } },
    { from: { path: '^web/src/ui/' }, to: { path: '^web/src/(?:ui|lib|i18n)/' } },
    { from: { path: '^web/src/(?:lib|config|i18n|styles)/' }, to: { path: '^web/src/(?:lib|config|i18n|styles)/' } },
    // infra and e2e: tools for everything.
    { from: { path: '^infra/' }, to: { path: '^(?:infra|api/src|shared/src)/|node_modules/' } },
    { from: { path: '^infra/' }, to: { dependencyTypes: ['core'] } },
    { from: { path: '^e2e/' }, to: { path: '^(?:e2e|infra|api/src|shared/src)/|node_modules/' } },
    { from: { path: '^e2e/' }, to: { dependencyTypes: ['core'] } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(?:^|/)(?:dist|coverage)/' },
    combinedDependencies: true,
    tsPreCompilationDeps: true,
    detectJSDocImports: false,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['types', 'import', 'module', 'node', 'default'],
      extensions: ['.ts', '.tsx', '.mjs', '.js', '.cjs', '.json', '.d.ts', '.css'],
      mainFields: ['module', 'main', 'types'],
    },
  },
};
