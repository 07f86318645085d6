// The import law of DEVELOPERS.md as rules that fail the build.
const only = (name, from, to, comment) => ({ name, severity: 'error', comment, from: { path: from }, to: { path: to } });
const PACKAGES = '^packages/(?:physics|recipe-model|statistics|imaging|api-client)/';

/** Modules of the api in rows: a module may import from lower rows only. */
const ROWS = [
  ['config', 'common', 'database'],
  ['ledger', 'storage', 'mail', 'health', 'jobs'],
  ['shops'],
  ['members'],
  ['auth'],
  ['machines', 'lenses', 'materials', 'photos'],
  ['coupons'],
  ['recipes'],
  ['sign-offs'],
  ['runs'],
  ['finder'],
];
const higher = ROWS.slice(0, -1).map((row, index) => {
  const from = `^apps/api/src/(?:${row.join('|')})/`;
  const to = `^apps/api/src/(?:${ROWS.slice(index + 1)
    .flat()
    .join('|')})/`;
  return only(`api-row-${index}`, from, to, `${row.join(', ')} may not import from a higher row`);
});

/** @type {import('dependency-cruiser').IConfiguration} */
module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    only('packages-know-no-app', PACKAGES, '^(?:apps|db)/', 'packages stand below the applications and the database'),
    only('db-knows-no-package', '^db/(?:src|migrations|postgres)/', '^(?:apps|packages)/', 'the schema is nobody’s child'),
    only('physics-imports-statistics-only', '^packages/physics/', '^packages/(?!physics|statistics)'),
    only('recipe-model-imports-physics-only', '^packages/recipe-model/', '^packages/(?!recipe-model|physics)'),
    only('imaging-imports-statistics-only', '^packages/imaging/', '^packages/(?!imaging|statistics)'),
    only('statistics-imports-nothing', '^packages/statistics/', '^packages/(?!statistics)'),
    only('api-client-imports-nothing', '^packages/api-client/', '^packages/(?!api-client)'),
    only('api-knows-no-client', '^apps/api/', '^(?:packages/api-client|apps/web)/'),
    only('web-knows-no-server', '^apps/web/src', '^(?:db|apps/api|apps/cli)/'),
    {
      name: 'science-is-pure',
      severity: 'error',
      comment: 'science packages run in the browser, a worker and the api alike',
      from: { path: '^packages/(?:physics|recipe-model|statistics|imaging)/src', pathNot: '\\.spec\\.ts$' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'repositories-own-the-database',
      severity: 'error',
      comment: 'only repositories and database/ import the schema',
      from: { path: '^apps/api/src/', pathNot: '(?:\\.repository\\.ts$|^apps/api/src/database/|\\.spec\\.ts$)' },
      to: { path: '^db/' },
    },
    {
      name: 'controllers-see-no-repository',
      severity: 'error',
      from: { path: '\\.controller\\.ts$' },
      to: { path: '\\.repository\\.ts$' },
    },
    {
      name: 'pure-files-stay-pure',
      severity: 'error',
      comment: 'mappers, policies, states and diffs hold no Nest and no I/O',
      from: { path: '^apps/api/src/.*(?:\\.mapper|\\.policy|-state|-diff)\\.ts$' },
      to: {
        path: '(?:node_modules/(?:@nestjs/(?!swagger)|drizzle|postgres)|\\.service\\.ts$|\\.repository\\.ts$)',
        dependencyTypesNot: ['type-only'],
      },
    },
    ...higher,
    {
      name: 'another-modules-repository-is-private',
      severity: 'error',
      from: { path: '^apps/api/src/([^/]+)/', pathNot: '\\.spec\\.ts$' },
      to: { path: '\\.repository\\.ts$', pathNot: '^apps/api/src/(?:$1|database)/' },
    },
    {
      name: 'a-feature-imports-no-other-feature',
      severity: 'error',
      from: { path: '^apps/web/src/features/([^/]+)/' },
      to: { path: '^apps/web/src/features/', pathNot: '^apps/web/src/features/$1/' },
    },
    only('features-know-no-route', '^apps/web/src/features/', '^apps/web/src/(?:routes|app)/'),
    only('components-know-no-feature', '^apps/web/src/(?:components|lib)/', '^apps/web/src/(?:features|routes|app)/'),
    only('routes-know-no-app', '^apps/web/src/routes/', '^apps/web/src/app/(?!paths)'),
    {
      name: 'api-client-through-hooks',
      severity: 'error',
      comment: 'only x.api.ts files and lib/ import the api client',
      from: { path: '^apps/web/src/', pathNot: '(?:\\.api\\.ts$|^apps/web/src/lib/|^apps/web/src/testing/|\\.spec\\.tsx?$)' },
      to: { path: '^packages/api-client/' },
    },
    {
      name: 'no-test-code-in-production',
      severity: 'error',
      from: { pathNot: '(?:\\.(?:int-|e2e-)?spec\\.tsx?$|/test/|/testing/|jest|^db/seed/)' },
      to: { path: '(?:\\.(?:int-|e2e-)?spec\\.tsx?$|/testing/|/test/)' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(?:/dist/|/generated/|\\.data/|jest\\.config\\.cjs$)' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['@proofplate/source', 'import', 'require', 'node', 'default'],
      extensions: ['.ts', '.tsx', '.js', '.cjs', '.mjs'],
    },
  },
};
