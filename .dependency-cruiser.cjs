/* Import boundaries. Each rule says in its comment what a newcomer may rely on. */
const SHARED = '^packages/shared/src/';
const API = '^packages/api/src/';
const WEB = '^packages/web/src/';
const no = (name, comment, from, to) => ({ name, comment, severity: 'error', from, to });

module.exports = {
  forbidden: [
    no(
      'no-cycles',
      'No circular imports at run time.',
      {},
      { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    ),
    no(
      'shared-is-the-floor',
      'shared knows neither web nor api.',
      { path: SHARED },
      { path: '^packages/(web|api)/|^seed/' },
    ),
    no(
      'shared-is-pure',
      'shared does no I/O.',
      { path: SHARED, pathNot: '\\.test\\.ts$' },
      { dependencyTypes: ['core'] },
    ),
    no(
      'web-and-api-never-meet',
      'web reaches api over HTTP only.',
      { path: '^packages/web/src/' },
      { path: '^packages/api/' },
    ),
    no('api-knows-no-web', 'api knows no screen.', { path: API }, { path: '^packages/web/' }),
    no(
      'nothing-imports-seed',
      'Only commands load the demo company.',
      { path: '^packages/', pathNot: '^packages/(api/src/(main|commands)|api/bench|web/e2e)' },
      { path: '^seed/' },
    ),
    no(
      'low-floors-know-no-feature',
      'Plumbing knows no feature.',
      {
        path: '^packages/(web/src/(components|lib)|api/src/(db|http|authz|outbox|mail|realtime|jobs|integrations|paper))/',
      },
      { path: '/src/features/' },
    ),
    no(
      'components-know-no-data',
      'The design system knows no data.',
      { path: `${WEB}components/` },
      { path: `${WEB}(lib/api|app)/|@tanstack|shared/src/contracts` },
    ),
    no(
      'enter-by-the-door',
      'A feature is entered by its index.ts, or by its pages from the router.',
      { path: '^(packages/(?:web|api)/src/features)/([^/]+)/' },
      { path: '^$1/[^/]+/', pathNot: '^$1/$2/|^$1/[^/]+/index\\.ts$' },
    ),
    no(
      'web-features-meet-only-in-pages',
      'On the web, features meet only in pages.',
      { path: `${WEB}features/([^/]+)/(?!pages/)` },
      { path: `${WEB}features/`, pathNot: `${WEB}features/$1/` },
    ),
    no(
      'models-stand-alone',
      'A model imports no other model.',
      { path: `${API}db/models/(?!index\\.ts)` },
      { path: `${API}db/models/`, pathNot: `${API}db/models/columns\\.ts` },
    ),
    no(
      'no-test-code-in-product',
      'Product code imports no test code.',
      { pathNot: '/testing/|\\.test\\.|/e2e/|/bench/' },
      { path: '/testing/|\\.test\\.' },
    ),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '/dist/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.base.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'default'],
      extensions: ['.ts', '.tsx', '.mjs', '.js'],
    },
  },
};
