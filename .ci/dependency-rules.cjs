const { join } = require('node:path');

/**
 * Who may import whom. Everything that is not allowed here is an error.
 *
 * The arrows run one way: client and server to the trade (`shared/`), and inside the trade from the plan outward to
 * what is computed of it. Another module is entered through its `index.ts`, never deeper.
 * DEVELOPERS.md says why; `.ci/import-rules.mjs` runs this and proves that it bites.
 */

/** Modules of `shared/` in order, each with the modules that it may import. */
const toForging = ['units', 'steels', 'bar', 'steps', 'design', 'forging'];
const toChecks = [...toForging, 'metallurgy', 'checks'];
const trade = {
  units: [],
  steels: ['units'],
  bar: ['units', 'steels'],
  steps: ['units', 'bar'],
  design: ['units', 'steels', 'bar', 'steps'],
  forging: ['units', 'steels', 'bar', 'steps', 'design'],
  metallurgy: toForging,
  checks: [...toForging, 'metallurgy'],
  pattern: toForging,
  planner: toChecks,
  stock: toForging,
  card: [...toChecks, 'pattern', 'planner', 'stock'],
};

/** Modules of `shared/` that state the form of data from outside. */
const withSchemas = ['steps', 'design', 'checks'];

/** Feature folders of `src/app`: each loads on its own and imports no other. */
const features = ['bench', 'editor', 'planner', 'steels', 'rack', 'anvil', 'shop', 'account', 'shared-view'];

const clientPackages = '@angular/|rxjs/|tslib/|zod/|idb/|file-saver/|qrcode/|@material-symbols/|three/';
const serverNever = '@angular/|rxjs/|konva/|three/|idb/|file-saver/|@material-symbols/|zone\\.js/';

/** Specs, fakes and builders, and the programs that the crash test kills. */
const spec = '\\.spec\\.ts$|\\btesting/|\\bcrash/';
const index = '/index\\.ts$';
const anyOf = (names) => `(?:${names.join('|')})`;
const installed = (packages) => `node_modules/(?:@types/)?(?:${packages})`;

const insideShared = Object.entries(trade).flatMap(([name, others]) => [
  // Its own files, and the doors of the modules that it builds on.
  { from: { path: `^shared/${name}/` }, to: { path: `^shared/${name}/` } },
  ...(others.length === 0
    ? []
    : [{ from: { path: `^shared/${name}/` }, to: { path: `^shared/${anyOf(others)}${index}` } }]),
]);

const insideClient = features.map((name) => ({
  from: { path: `^src/app/${name}/` },
  to: { path: [`^src/app/${name}/`, '^src/app/(?:core|ui)/', `^shared/[^/]+${index}`] },
}));

module.exports = {
  allowedSeverity: 'error',
  allowed: [
    ...insideShared,
    { from: { path: `^shared/${anyOf(withSchemas)}/` }, to: { path: installed('zod/') } },
    {
      from: { path: `^shared/.*(?:${spec})` },
      to: {
        path: [
          '^shared/[^/]+/testing/',
          `^shared/[^/]+${index}`,
          installed('fast-check/|jasmine'),
          installed('zod/'),
        ],
      },
    },

    {
      from: { path: '^server/', pathNot: spec },
      to: { path: ['^server/', `^shared/[^/]+${index}`], pathNot: spec },
    },
    { from: { path: '^server/' }, to: { dependencyTypes: ['core'] } },
    {
      from: { path: '^server/' },
      to: { dependencyTypes: ['npm'], path: 'node_modules/', pathNot: installed(serverNever) },
    },
    // Run from its sources, a worker thread has to be taught TypeScript first.
    { from: { path: '^server/compute/worker-from-sources\\.mjs$' }, to: { path: installed('tsx/') } },
    {
      from: { path: `^server/.*(?:${spec})` },
      to: { path: ['^server/', `^shared/[^/]+${index}`, '^shared/[^/]+/testing/'] },
    },
    {
      from: { path: `^server/.*(?:${spec})` },
      to: { dependencyTypes: ['npm', 'npm-dev'], path: 'node_modules/', pathNot: installed(serverNever) },
    },

    // The page starts with main.ts, which knows the application; its routes know the door of each feature.
    { from: { path: '^src/main\\.ts$' }, to: { path: '^src/app/[^/]+\\.ts$' } },
    {
      from: { path: '^src/app/[^/]+\\.ts$' },
      to: {
        path: ['^src/app/[^/]+\\.ts$', '^src/app/(?:core|ui)/', `^src/app/${anyOf(features)}/[^/]+\\.ts$`],
      },
    },
    { from: { path: '^src/app/core/' }, to: { path: ['^src/app/(?:core|ui)/', `^shared/[^/]+${index}`] } },
    { from: { path: '^src/app/ui/' }, to: { path: ['^src/app/ui/', `^shared/[^/]+${index}`] } },
    ...insideClient,
    { from: { path: '^src/' }, to: { path: installed(clientPackages) } },
    { from: { path: '^src/app/editor/canvas/' }, to: { path: installed('konva/') } },
    {
      from: { path: `^src/.*(?:${spec})` },
      to: { path: ['^shared/[^/]+/testing/', installed('fast-check/|jasmine|axe-core/')] },
    },

    // The journeys see the application as its users do: in a browser, over HTTP.
    { from: { path: '^e2e/' }, to: { path: ['^e2e/', `^shared/[^/]+${index}`] } },
    { from: { path: '^e2e/' }, to: { dependencyTypes: ['core'] } },
    { from: { path: '^e2e/' }, to: { dependencyTypes: ['npm-dev'], path: 'node_modules/' } },
  ],

  forbidden: [
    {
      name: 'no-cycle',
      comment: 'Two files that need each other are one thing in two files, or two with the wrong seam.',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'resolvable',
      comment:
        'An import that leads nowhere breaks the build, or is a package that package.json does not name.',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
    {
      name: 'no-test-code-in-the-product',
      comment: 'Specs, fakes and builders stay out of what is shipped.',
      severity: 'error',
      from: { path: '^(?:src|server|shared)/', pathNot: spec },
      to: { path: spec },
    },
    {
      name: 'shared-index-only',
      comment: 'Enter another module of shared/ through its index.ts.',
      severity: 'error',
      from: { path: '^(?:src|server|e2e)/' },
      to: { path: '^shared/', pathNot: `^shared/[^/]+${index}|/testing/` },
    },
    {
      name: 'features-apart',
      comment: 'Lift what two features need into core/, ui/ or shared/, or go through the router.',
      severity: 'error',
      from: { path: `^src/app/(${anyOf(features)})/` },
      to: { path: `^src/app/${anyOf(features)}/`, pathNot: '^src/app/$1/' },
    },
    {
      name: 'konva-in-the-canvas',
      comment: 'Only editor/canvas draws with Konva, so that it loads with the editor and can be replaced.',
      severity: 'error',
      from: { path: '^(?:src|shared)/', pathNot: '^src/app/editor/canvas/' },
      to: { path: 'node_modules/konva/' },
    },
    {
      name: 'shared-knows-no-house',
      comment: 'The trade runs in the page, in a worker and on the server: it imports none of them.',
      severity: 'error',
      from: { path: '^shared/' },
      to: { path: '^(?:src|server|e2e)/' },
    },
    {
      name: 'server-never-client',
      comment: 'What client and server both need is trade, and lives in shared/.',
      severity: 'error',
      from: { path: '^server/' },
      to: { path: '^src/' },
    },
    {
      name: 'client-never-server',
      comment: 'The client speaks to the server over HTTP.',
      severity: 'error',
      from: { path: '^src/' },
      to: { path: '^server/' },
    },
  ],

  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^shared/pattern/kernel/assembly/|^shared/pattern/kernel/build\\.mjs$|^dist/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: join(__dirname, '..', 'src', 'tsconfig.spec.json') },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'types', 'node', 'default'],
      extensions: ['.ts', '.js', '.mjs', '.json'],
    },
  },
};
