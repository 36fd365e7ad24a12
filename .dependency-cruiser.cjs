/**
 * The floors of the house: which room may import which. Type-only imports count (`tsPreCompilationDeps`), since a type
 * that points upwards is a floor that leaks. tests/run/floors.test.ts builds a small house for each rule and sees it fire.
 *
 *   core/job, core/quantity     the ground: the document and typed quantities
 *   core/geometry -> core/loading -> core/statics -> core/checks -> core/assess
 *   core/survey                 beside them, over the ground and geometry
 *   core/drawing -> core/export above assess
 *   renderer                    over core; knows its host only by the types in app/host.ts
 *   app                         over core; Electron in app/desktop and app/preload alone
 */

/** What every floor may stand on. */
const GROUND = '^core/(job|quantity)/';

/** Rooms of the core from the ground up, each with the rooms that it may stand on besides itself and the ground. */
const CORE_ROOMS = {
  geometry: [],
  loading: ['geometry'],
  statics: ['geometry', 'loading'],
  checks: ['geometry', 'loading', 'statics'],
  assess: ['geometry', 'loading', 'statics', 'checks'],
  survey: ['geometry'],
  drawing: ['geometry', 'loading', 'statics', 'checks', 'assess', 'survey'],
  export: ['geometry', 'loading', 'statics', 'checks', 'assess', 'survey', 'drawing'],
};

/** Packages that are plain computation: no DOM, no Node, no framework. */
const CORE_PACKAGES = [
  'valibot',
  '@valibot/to-json-schema',
  'mathjs',
  'fflate',
  'pdfkit',
  '@types/pdfkit',
  '@tarikjabiri/dxf',
];

const forbid = (name, comment, from, to) => ({ name, comment, severity: 'error', from, to });

const coreRules = Object.entries(CORE_ROOMS).map(([room, under]) =>
  forbid(
    `core-${room}-floor`,
    `core/${room} stands on the ground${under.length > 0 ? `, ${under.join(', ')}` : ''} and nothing else of the core`,
    { path: `^core/${room}/`, pathNot: GROUND },
    { path: '^core/', pathNot: [GROUND, ...[room, ...under].map((name) => `^core/${name}/`)] },
  ),
);

module.exports = {
  forbidden: [
    forbid('no-cycles', 'two modules that need each other are one module', {}, { circular: true }),
    forbid(
      'resolves',
      'an import that cannot be followed would slip past every other rule',
      {},
      { couldNotResolve: true },
    ),
    forbid(
      'core-ground-floor',
      'the document and typed quantities stand on nothing of the core but each other',
      { path: GROUND },
      { path: '^core/', pathNot: GROUND },
    ),
    ...coreRules,
    forbid(
      'core-rooms',
      'a new room of the core needs its floor named above',
      {},
      {
        path: '^core/',
        pathNot: [GROUND, ...Object.keys(CORE_ROOMS).map((room) => `^core/${room}/`)],
      },
    ),
    forbid(
      'core-stands-alone',
      'the core knows neither page nor shell',
      { path: '^core/' },
      { path: '^(app|renderer)/' },
    ),
    forbid('core-no-node', 'the core runs in page and shell alike', { path: '^core/' }, { dependencyTypes: ['core'] }),
    forbid(
      'core-packages',
      'the core uses plain computation only',
      { path: '^core/' },
      {
        path: 'node_modules/',
        pathNot: CORE_PACKAGES.map((name) => `node_modules/${name}/`),
      },
    ),
    forbid(
      'renderer-host-contract',
      'the page knows its shell only by the contract',
      { path: '^renderer/' },
      { path: '^app/', pathNot: '^app/host[.]ts$' },
    ),
    forbid(
      'contract-types-only',
      'the contract holds no code to run',
      { path: '^renderer/' },
      {
        path: '^app/host[.]ts$',
        dependencyTypesNot: ['type-only'],
      },
    ),
    forbid(
      'contract-stands-alone',
      'both sides read the contract; it reads neither',
      { path: '^app/host[.]ts$' },
      { path: '.' },
    ),
    forbid('renderer-no-node', 'the page runs in a sandbox', { path: '^renderer/' }, { dependencyTypes: ['core'] }),
    forbid(
      'session-under-screen',
      'the document and its undo know no screen',
      { path: '^renderer/session/' },
      {
        path: '^renderer/(board|panels|sheets)/',
      },
    ),
    forbid(
      'konva-on-board',
      'one room paints',
      { pathNot: '^(renderer/board|tests)/' },
      { path: 'node_modules/konva/' },
    ),
    forbid(
      'electron-in-shell',
      'one shell knows Electron',
      { pathNot: '^app/(desktop|preload)/' },
      {
        path: ['node_modules/electron/', '^electron$'],
      },
    ),
    forbid(
      'app-over-core',
      'a shell serves the built page and imports none of its sources',
      { path: '^app/' },
      {
        path: '^renderer/',
      },
    ),
    forbid(
      'files-under-shells',
      'files and page serving know no shell',
      { path: '^app/(files|page)/' },
      {
        path: '^app/',
        pathNot: '^app/(files|page)/|^app/host[.]ts$',
      },
    ),
    forbid(
      'tests-outside',
      'the product never imports its tests',
      { path: '^(app|core|renderer|assets)/' },
      { path: '^tests/' },
    ),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^dist/' },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['svelte', 'browser', 'import', 'types', 'node', 'default', 'require'],
    },
  },
};
