/** Base folders of core/: each may import those before it. */
const BASE = ['notice', 'units', 'numerics', 'chemistry'];

/** Numbered folders of core/: each may import the base and lower numbers; folders of one number do not know each other. */
const LAYERS = [
  ['table'],
  ['run'],
  ['endpoints', 'sheet'],
  ['model'],
  ['fit'],
  ['inference', 'speciation'],
  ['results'],
  ['assay'],
  ['report'],
];

const allowedFrom = new Map([
  ...BASE.map((folder, index) => [folder, BASE.slice(0, index)]),
  ...LAYERS.flatMap((layer, index) => layer.map((folder) => [folder, [...BASE, ...LAYERS.slice(0, index).flat()]])),
]);

const layers = [...allowedFrom].map(([folder, allowed]) => ({
  name: `core-${folder}`,
  comment: `core/${folder} may import only ${[folder, ...allowed].join(', ')}: text comes in at the top of core/, a report goes out at the bottom, nothing flows back up.`,
  severity: 'error',
  from: { path: `^core/${folder}/` },
  to: { path: '^core/', pathNot: `^core/(${[folder, ...allowed].join('|')})/` },
}));

/** Where in core/ and app/ a package may be imported, and why nowhere else. */
const PACKAGES = [
  ['papaparse', '^core/table/', 'what a text export is, is decided in one place: delimiter and decimal mark together'],
  [
    'ml-levenberg-marquardt',
    '^core/fit/leastSquares\\.ts$',
    'leastSquares.ts steers it step by step; its own options mislead',
  ],
  ['ml-matrix', '^core/numerics/', 'linear algebra is wrapped there, so that the rest speaks of Float64Array'],
  ['@stdlib/', '^core/numerics/', 'distributions are wrapped there'],
  ['pure-rand', '^core/numerics/', 'random numbers are wrapped there, where seeds are looked after'],
  ['d3-random', '^core/numerics/', 'random numbers are wrapped there, where seeds are looked after'],
  ['valibot', '^(core/sheet|app)/', 'what a person declares is checked in core/sheet, what the page stored in app/'],
  ['react', '^app/', 'core/ must run without a page'],
  ['zustand', '^app/', 'core/ must run without a page'],
];

const packages = PACKAGES.map(([name, allowed, reason]) => ({
  name: `package-${name.replace(/\W+/g, '')}`,
  comment: `${name} may be imported only from ${allowed}: ${reason}.`,
  severity: 'error',
  from: { path: '^(core|app)/', pathNot: allowed },
  to: { path: name.endsWith('/') ? `^node_modules/${name}` : `^node_modules/${name}(-dom)?/` },
}));

/** @type {import('dependency-cruiser').IConfiguration} */
export default {
  forbidden: [
    {
      name: 'no-circles',
      comment: 'Files that import each other in a circle cannot be understood or tested one at a time.',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'nothing-unresolved',
      comment: 'An import that leads nowhere hides every wall behind it.',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true, pathNot: '\\?(worker|raw|inline|url)(&|$)|\\.(css|svg|csv|txt)(\\?|$)' },
    },
    {
      name: 'core-knows-no-app',
      comment: 'core/ is the chemistry alone: no page, no terminal, no tests, no sample data.',
      severity: 'error',
      from: { path: '^core/' },
      to: { path: '^(app|test|sample-data)/' },
    },
    {
      name: 'core-face-is-outward',
      comment: 'core/index.ts is the face for others; inside core/, import the file itself, or circles follow.',
      severity: 'error',
      from: { path: '^core/', pathNot: '^core/index\\.ts$' },
      to: { path: '^core/index\\.ts$' },
    },
    {
      name: 'core-known-folders',
      comment: 'A new folder of core/ needs its place among the layers before anything stands in it.',
      severity: 'error',
      from: { path: '^core/', pathNot: `^core/((${[...allowedFrom.keys()].join('|')})/|(index|platform\\.d)\\.ts$)` },
      to: {},
    },
    ...layers,
    {
      name: 'core-no-platform',
      comment: 'core/ runs in a browser, in a worker and in Node: it may use none of their modules.',
      severity: 'error',
      from: { path: '^core/' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'core-packages',
      comment: 'core/ may use only packages chosen for it; a new one is a decision, to be written down here.',
      severity: 'error',
      from: { path: '^core/' },
      to: {
        path: '^node_modules/',
        pathNot:
          '^node_modules/(papaparse|@types/papaparse|ml-levenberg-marquardt|ml-matrix|valibot|pure-rand|d3-random|@types/d3-random|@stdlib|@noble/hashes)/',
      },
    },
    ...packages,
    {
      name: 'package-plotly',
      comment:
        'One file of app/figures draws; all others hand it plain figure objects (types of plotly.js are free there).',
      severity: 'error',
      from: { path: '^(core|app)/', pathNot: '^app/figures/' },
      to: { path: '^node_modules/plotly\\.js/' },
    },
    {
      name: 'app-through-the-face',
      comment: 'app/ knows core/ only through core/index.ts, so that the inside of core/ can change.',
      severity: 'error',
      from: { path: '^app/' },
      to: { path: '^core/', pathNot: '^core/index\\.ts$' },
    },
    {
      name: 'app-knows-no-test',
      comment: 'What people use must not lean on what tests it.',
      severity: 'error',
      from: { path: '^app/' },
      to: { path: '^test/' },
    },
    {
      name: 'page-no-platform',
      comment: "The page has no Node; only the terminal command and the build may use Node's modules.",
      severity: 'error',
      from: { path: '^app/', pathNot: '^app/(terminal|build)/' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'page-no-tools',
      comment: 'A package for development would travel to everyone who opens the page.',
      severity: 'error',
      from: { path: '^(app|core)/', pathNot: '^app/(build/|terminal/launch\\.mjs$)' },
      to: { dependencyTypes: ['npm-dev'], dependencyTypesNot: ['type-only'], pathNot: '^node_modules/@types/' },
    },
    {
      name: 'page-and-terminal-apart',
      comment: 'The page and the terminal command do the same job side by side; what they share belongs in core/.',
      severity: 'error',
      from: { path: '^app/(?!terminal/)' },
      to: { path: '^app/terminal/' },
    },
    {
      name: 'terminal-no-page',
      comment: 'The page and the terminal command do the same job side by side; what they share belongs in core/.',
      severity: 'error',
      from: { path: '^app/terminal/' },
      to: { path: '^app/(?!terminal/)' },
    },
    {
      name: 'simulator-independent',
      comment: 'The simulator checks core/: it must not compute with what it checks.',
      severity: 'error',
      from: { path: '^test/simulator/' },
      to: { path: '^(core|app)/' },
    },
    {
      name: 'sample-data-independent',
      comment: 'Sample runs come from the independent simulator, or a fit to them would prove nothing.',
      severity: 'error',
      from: { path: '^sample-data/' },
      to: { path: '^(core|app)/' },
    },
  ],
  options: {
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    doNotFollow: { path: '^node_modules/' },
    enhancedResolveOptions: {
      extensions: ['.ts', '.tsx', '.js', '.mjs', '.json', '.css'],
      exportsFields: ['exports'],
      conditionNames: ['import', 'node', 'default', 'types'],
      mainFields: ['module', 'main', 'types'],
    },
  },
};
