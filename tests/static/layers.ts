/**
 * The layers of the product and the arrows between them, as data. A file that fits no layer is a fault too: the layout is
 * fixed, and a new kind of place is a decision, not an accident.
 */
export interface Layer {
  name: string;
  /** Which paths belong to it; the first layer that fits wins. */
  paths: RegExp;
  /** Layers it may import besides itself. */
  mayImport: string[];
  /** Packages it may import; without the list, any that package.json names. Built-in modules count as packages. */
  packages?: string[];
  /** Runs only under Astro, so that `astro:` modules exist there. */
  underAstro?: true;
  /** May lean on development packages: it is never part of the installed product. */
  forDevelopment?: true;
}

// Tables without code that touches anything: they run in the browser as well as on the server.
const pure = ['doe', 'messages', 'contracts'];
const markup = ['ui', 'island', 'i18n', 'styles'];

export const layers: Layer[] = [
  {
    name: 'tests',
    paths: /^tests\/|\.(test|bench)\.tsx?$/,
    mayImport: ['*'],
    underAstro: true,
    forDevelopment: true,
  },
  { name: 'types', paths: /^src\/.*\.d\.ts$/, mayImport: ['*'], underAstro: true },
  {
    name: 'main',
    paths: /^src\/(main|dev-boot)\.ts$/,
    mayImport: ['server', 'worker', 'feature-server', 'i18n'],
  },
  {
    name: 'middleware',
    paths: /^src\/middleware\.ts$/,
    mayImport: ['server', 'contracts', 'i18n'],
    underAstro: true,
  },
  {
    name: 'pages',
    paths: /^src\/pages\//,
    mayImport: [
      'layouts',
      ...markup,
      'feature-markup',
      'feature-island',
      'feature-rules',
      'feature-server',
      'server',
      ...pure,
    ],
    underAstro: true,
  },
  // Layouts frame pages for whoever reads them: they ask the server who that is, as pages do.
  {
    name: 'layouts',
    paths: /^src\/layouts\//,
    mayImport: [...markup, 'feature-rules', 'server', 'contracts'],
    underAstro: true,
  },
  { name: 'ui', paths: /^src\/components\/ui\//, mayImport: ['styles'], underAstro: true },
  { name: 'island', paths: /^src\/components\/island\//, mayImport: ['ui', 'i18n'] },
  {
    name: 'feature-server',
    paths: /^src\/features\/[^/]+\/[^/]+\.(repository|service)\.ts$/,
    mayImport: ['feature-rules', 'server', 'i18n', ...pure],
  },
  {
    name: 'feature-queries',
    paths: /^src\/features\/[^/]+\/[^/]+\.queries\.ts$/,
    mayImport: ['feature-rules', 'island', 'i18n', ...pure],
  },
  { name: 'feature-rules', paths: /^src\/features\/.*\.ts$/, mayImport: ['i18n', ...pure] },
  {
    name: 'feature-island',
    paths: /^src\/features\/.*\.tsx$/,
    mayImport: ['feature-rules', 'feature-queries', ...markup, ...pure],
  },
  {
    name: 'feature-markup',
    paths: /^src\/features\/.*\.astro$/,
    mayImport: ['feature-rules', 'feature-island', ...markup, ...pure],
    underAstro: true,
  },
  {
    name: 'doe',
    paths: /^src\/lib\/doe\//,
    mayImport: [],
    packages: ['simple-statistics', 'ml-matrix', 'zod'],
  },
  { name: 'messages', paths: /^src\/lib\/messages\//, mayImport: [], packages: ['libphonenumber-js', 'zod'] },
  { name: 'i18n', paths: /^src\/i18n\//, mayImport: ['locales'] },
  { name: 'locales', paths: /^locales\//, mayImport: [] },
  {
    name: 'contracts',
    paths: /^src\/server\/(errors|auth\/permissions)\.ts$/,
    mayImport: ['i18n'],
    packages: [],
  },
  { name: 'server', paths: /^src\/server\//, mayImport: ['i18n', 'messages', 'contracts'] },
  {
    name: 'worker',
    paths: /^src\/worker\//,
    mayImport: ['feature-rules', 'feature-server', 'server', 'i18n', ...pure],
  },
  { name: 'fakes', paths: /^src\/fakes\//, mayImport: ['messages'], forDevelopment: true },
  { name: 'styles', paths: /^src\/styles\//, mayImport: [], forDevelopment: true },
  {
    name: 'commands',
    paths: /^src\/commands\//,
    mayImport: ['feature-rules', 'feature-server', 'server', 'worker', 'i18n', ...pure],
    forDevelopment: true,
  },
  { name: 'migrations', paths: /^migrations\//, mayImport: ['server'] },
  {
    name: 'seeds',
    paths: /^seeds\//,
    mayImport: ['feature-rules', 'feature-server', 'server', 'i18n', ...pure],
  },
  {
    name: 'configuration',
    paths: /^(knexfile\.ts|astro\.config\.mjs)$/,
    mayImport: ['server', 'styles', 'commands'],
    underAstro: true,
    forDevelopment: true,
  },
];

/** The layer of a path, if it has one. */
export function layerOf(path: string): Layer | undefined {
  return layers.find((layer) => layer.paths.test(path));
}
