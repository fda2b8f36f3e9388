/** Who may import whom. tests/repo/boundaries.test.ts shows that each rule fires. */
const CODE = '^(app|components|db|lib)/|^[^/]+\\.ts$';
const BROWSER_SIDE = '^(components|lib/walk|lib/schemas|lib/messages|lib/findings)/';

/** @type {import('dependency-cruiser').IConfiguration} */
const config = {
  forbidden: [
    {
      name: 'no-circular',
      severity: 'error',
      comment: 'A circle of files has no order to read it in.',
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ['type-only'] } },
    },
    {
      name: 'findings-is-pure',
      severity: 'error',
      comment: 'lib/findings imports itself, zod, liquidjs and ml-matrix.',
      from: { path: '^lib/findings/' },
      to: { pathNot: '^lib/findings/|^node_modules/(zod|liquidjs|ml-matrix)/' },
    },
    {
      name: 'only-db-touches-the-database',
      severity: 'error',
      comment: 'Queries live in db/, where the scope rule lives.',
      from: { path: CODE, pathNot: '^db/' },
      to: { path: '^node_modules/drizzle-orm/|^db/(schema|with-actor)', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'only-db-and-the-worker-connect',
      severity: 'error',
      comment: 'The worker opens the queue connection and closes both; nothing else holds a connection.',
      from: { path: CODE, pathNot: '^db/|^worker\\.ts$' },
      to: { path: '^node_modules/pg/|^db/client', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'nothing-imports-app',
      severity: 'error',
      from: { pathNot: '^app/' },
      to: { path: '^app/' },
    },
    {
      name: 'ui-knows-no-domain',
      severity: 'error',
      from: { path: '^components/ui/' },
      to: { path: '^(app|components|db|lib)/', pathNot: '^components/ui/' },
    },
    {
      name: 'browser-takes-types-from-db-only',
      severity: 'error',
      comment: 'What runs in the browser may name the shapes of db/, never its code.',
      from: { path: BROWSER_SIDE },
      to: { path: '^db/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'schemas-stand-low',
      severity: 'error',
      from: { path: '^lib/schemas/' },
      to: { path: '^(app|components|db|lib)/', pathNot: '^lib/(schemas|findings)/', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'db-stands-below-the-rest',
      severity: 'error',
      comment: 'db/ enqueues and queries; what does the work imports db/, not the other way round.',
      from: { path: '^db/' },
      to: { path: '^(app|components)/|^lib/(auth|jobs|mail|payments|reports|storage|walk)/' },
    },
    {
      name: 'lib-draws-nothing',
      severity: 'error',
      from: { path: '^lib/', pathNot: '^lib/reports/' },
      to: { path: '^components/' },
    },
    {
      name: 'reports-draw-with-report-parts',
      severity: 'error',
      from: { path: '^lib/reports/' },
      to: { path: '^components/', pathNot: '^components/(report|drawings)/' },
    },
    {
      name: 'components-take-what-they-show',
      severity: 'error',
      comment: 'A component is given its data; the server parts of lib/ stay on the server.',
      from: { path: '^components/' },
      to: { path: '^lib/(auth|jobs|mail|payments|reports|storage)/|^lib/env\\.ts$', dependencyTypesNot: ['type-only'] },
    },
    {
      name: 'only-auth-knows-next-auth',
      severity: 'error',
      from: { path: CODE, pathNot: '^lib/auth/' },
      to: { path: '^node_modules/next-auth/' },
    },
    {
      name: 'no-unlisted-package',
      severity: 'error',
      from: { path: CODE },
      to: { dependencyTypes: ['npm-no-pkg', 'npm-unknown', 'unknown'] },
    },
    {
      name: 'product-needs-no-dev-package',
      severity: 'error',
      from: { path: CODE, pathNot: '\\.config\\.ts$' },
      to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'], pathNot: '^node_modules/@types/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
    skipAnalysisNotInRules: true,
  },
};

export default config;
