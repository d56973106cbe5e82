/**
 * Who may import whom. Closed by default: each layer lists what it may reach, and anything else is an error.
 */
const LOCAL = '^(app|components|lib|workers|db)/|^(proxy|instrumentation)\\.ts$';

/** `from` may import only paths that match one of `to`; packages are given by name. */
function layer(name, from, to, { fromNot, packages = [] } = {}) {
  const allowedPackages = packages.map((p) => `node_modules/${p}(/|$)`);
  return {
    name,
    severity: 'error',
    from: { path: from, ...(fromNot ? { pathNot: fromNot } : {}) },
    to: { pathNot: [...to, ...allowedPackages] },
  };
}

const types = 'node_modules/@types/';

module.exports = {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    { name: 'no-unresolved', severity: 'error', from: {}, to: { couldNotResolve: true } },
    layer('inversion-is-pure', '^lib/inversion/', ['^lib/inversion/', types], {
      packages: ['ml-matrix', 'ml-levenberg-marquardt', '@stdlib', 'pure-rand'],
    }),
    layer(
      'files-read-and-write-tables',
      '^lib/files/',
      ['^lib/files/', '^lib/inversion/(index|types|constants)\\.ts$', types],
      {
        packages: ['papaparse', '@types/papaparse'],
      },
    ),
    layer(
      'schemas-describe',
      '^lib/schemas/',
      ['^lib/schemas/', '^lib/inversion/(index|types|constants)\\.ts$'],
      { packages: ['zod'] },
    ),
    layer('workers-are-thin', '^workers/', ['^workers/', '^lib/inversion/index\\.ts$'], {
      packages: ['comlink'],
    }),
    {
      name: 'db-stays-below-the-app',
      severity: 'error',
      from: { path: '^db/' },
      to: { path: '^(app|components|workers)/' },
    },
    {
      name: 'components-know-no-server',
      severity: 'error',
      from: { path: '^components/' },
      to: {
        path: ['^db/', '^app/', '^workers/(?!client\\.ts$)', '^lib/(env|headless)'],
        dependencyTypesNot: ['type-only'],
      },
    },
    {
      name: 'charts-are-pure',
      severity: 'error',
      comment: 'A chart draws what it is given: no fetching, no application state.',
      from: { path: '^components/charts/' },
      to: {
        path: ['^components/(?!charts/|ui/)', '^app/', '^workers/', 'node_modules/(swr|nuqs)/'],
      },
    },
    {
      name: 'app-reaches-the-database-through-verbs',
      severity: 'error',
      from: { path: ['^app/', '^proxy\\.ts$'], pathNot: '^app/_server/' },
      to: { path: '^db/(?!access/)' },
    },
    {
      name: 'index-is-the-door-of-the-inversion',
      severity: 'error',
      from: { path: LOCAL, pathNot: '^lib/inversion/' },
      to: { path: '^lib/inversion/(?!(index|types|constants)\\.ts$)' },
    },
    {
      name: 'not-to-tests-or-fixtures',
      severity: 'error',
      from: { path: LOCAL },
      to: { path: '^(tests|fixtures)/' },
    },
  ],
  options: {
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '\\.css$|node_modules/next/|^\\.next/' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'require', 'node', 'default', 'types'],
    },
  },
};
