import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { basename, dirname } from 'node:path';
import { fileURLToPath } from 'node:url';
import { transform } from 'lightningcss';
import type { Plugin, UserConfig } from 'vite';
import { defineConfig, type ViteUserConfig } from 'vitest/config';
import { chromiumArgs, chromiumPath, pageDefaults } from './tests/tools/browser.ts';
import { scriptFiles } from './.config/script-files.ts';
import { chunkOf } from './.config/chunk-of.ts';
import { coreMeasured, lateFile, lateFiles, printSizes, rowsWorkerFile, scriptFile, workerFile } from './tests/tools/sizes.ts';

const at = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** Dependencies by name: one that Vite finds only late makes it reload a page that is already running. */
const runtime = [
  'lit',
  'lit/decorators.js',
  'lit/static-html.js',
  ...['class-map', 'guard', 'if-defined', 'keyed', 'live', 'ref', 'repeat', 'when'].map(
    (name) => `lit/directives/${name}.js`,
  ),
  '@lit/context',
  'decimal.js',
  'simple-statistics',
  'yalps',
  'events',
  'pouchdb-core',
  'pouchdb-adapter-idb',
  'fflate',
  'papaparse',
];

const shared: UserConfig = {
  resolve: {
    alias: [
      // demo pages and tests may import the package by its public name
      { find: /^esterway$/, replacement: at('./src/index.ts') },
      { find: /^esterway\/(define|core|working|more|intake|intake-book|sheets|stock|balance)$/, replacement: at('./src') + '/$1.ts' },
    ],
    dedupe: ['lit', 'lit-html', 'lit-element', '@lit/reactive-element'],
  },
};

/** The page without a build and what it loads: handed out as they lie. */
const plainFiles: Readonly<Record<string, string>> = {
  ...Object.fromEntries(['script.html', 'script.css', 'base.css', 'icon.svg'].map((file) => [file, at(`./demo/${file}`)])),
  'esterway.min.js': scriptFile,
  ...Object.fromEntries(lateFiles.map((file) => [basename(file), file])),
  'esterway-worker.min.js': workerFile,
  'esterway-rows-worker.min.js': rowsWorkerFile,
};

const asTheyLie: Plugin = {
  name: 'as-they-lie',
  configureServer({ middlewares }) {
    middlewares.use((request, response, next) => {
      const name = (request.url ?? '').slice(1).replace(/[?#].*/, '');
      const file = plainFiles[name];
      const type = { html: 'text/html', js: 'text/javascript' }[name.split('.').at(-1) ?? ''];
      if (!file || !type || !existsSync(file)) return next();
      response.setHeader('Content-Type', `${type}; charset=utf-8`).end(readFileSync(file));
    });
  },
  generateBundle() {
    for (const [fileName, file] of Object.entries(plainFiles)) {
      if (existsSync(file)) this.emitFile({ type: 'asset', fileName, source: readFileSync(file) });
      else this.warn(`${fileName} is not built yet: the page without a build will say so. Run "npm run build" first.`);
    }
  },
};

/** `npm start`: the pages of demo/. */
const site: UserConfig = {
  ...shared,
  root: at('./demo'),
  appType: 'mpa',
  base: './',
  publicDir: false,
  plugins: [asTheyLie],
  server: { host: 'localhost', fs: { allow: [at('.')] } },
  optimizeDeps: { include: [...runtime, 'tabulator-tables'] },
};

const builds: Record<string, () => UserConfig> = {
  /** One ES module for each source file, dependencies left outside. Empties dist/ first. */
  lib: () => ({
    ...shared,
    publicDir: false,
    plugins: [workersFrom((file) => `new Worker(new URL('../../../browser/${file}', import.meta.url), { type: 'module' })`)],
    build: {
      target: 'es2022',
      outDir: 'dist',
      emptyOutDir: true,
      minify: false,
      sourcemap: true,
      lib: {
        entry: { index: at('./src/index.ts'), define: at('./src/define.ts'), core: at('./src/core.ts'), working: at('./src/working.ts'), more: at('./src/more.ts'), intake: at('./src/intake.ts'), 'intake-book': at('./src/intake-book.ts'), sheets: at('./src/sheets.ts'), stock: at('./src/stock.ts'), balance: at('./src/balance.ts') },
        formats: ['es'],
      },
      rolldownOptions: {
        external: [/^lit(\/|$)/, /^@lit\//, 'decimal.js', 'simple-statistics', 'yalps', 'events', /^pouchdb-/, 'fflate', 'papaparse'],
        output: {
          preserveModules: true,
          preserveModulesRoot: at('./src'),
          // the compiler's own helpers carry its version in their path
          entryFileNames: ({ name }) => `esm/${name.startsWith('_virtual/') ? `helpers/${basename(name)}` : name}.js`,
        },
      },
    },
  }),
  /** The script file for a page without a build step, and beside it what it fetches when asked for. */
  script: () => bundle('./src/define.ts', 'Esterway', scriptFile),
  /** What computes Monte Carlo off the page's thread: one file for the script file and for the ES modules. Built after the script file. */
  worker: () => bundle('./src/monte-carlo-worker.ts', 'EsterwayWorker', workerFile),
  /** What works rows of a sheet out off the page's thread, likewise. */
  rows: () => bundle('./src/rows-worker.ts', 'EsterwayRowsWorker', rowsWorkerFile),
  /** What `esterway/core` weighs with its dependency inside; only measured, never shipped. */
  core: () => bundle('./src/core.ts', 'EsterwayCore', coreMeasured),
  /** The demo pages as static files. */
  demo: () => ({
    ...site,
    build: {
      target: 'es2022',
      outDir: at('./dist/demo'),
      emptyOutDir: true,
      rolldownOptions: {
        input: readdirSync(at('./demo'), { recursive: true, encoding: 'utf8' })
          .filter((file) => file.endsWith('.html') && !(file in plainFiles))
          .map((file) => at(`./demo/${file}`)),
      },
    },
  }),
};

function bundle(entry: string, name: string, file: string): UserConfig {
  const beside = file === workerFile || file === rowsWorkerFile;
  const { version } = JSON.parse(readFileSync(at('./package.json'), 'utf8')) as { version: string };
  return {
    ...shared,
    publicDir: false,
    plugins: [
      smallTemplates,
      workersFrom(() => 'undefined'),
      ...(file === scriptFile ? [scriptFiles({ main: basename(file), name, fileOf: (chunk) => basename(lateFile(chunk.replace('define-', ''))) })] : []),
      ...(file === rowsWorkerFile ? [sizeTable] : []),
    ],
    build: {
      target: 'es2022',
      outDir: dirname(file),
      emptyOutDir: !beside,
      // a hundredth smaller than the default minifier's output, which counts against the budgets
      minify: 'terser',
      terserOptions: { ecma: 2020, module: true, compress: { passes: 3 } },
      sourcemap: true,
      reportCompressedSize: false,
      ...(!beside && { license: { fileName: 'LICENSES.md' } }), // minifying drops the notices of what is inside
      lib: { entry: at(entry), name, formats: [file === scriptFile ? 'es' : 'iife'], fileName: () => basename(file) },
      rolldownOptions: {
        preserveEntrySignatures: 'allow-extension', // what the parts share stays in the script file
        output: {
          chunkFileNames: '[name].js',
          ...(file === scriptFile && { codeSplitting: { includeDependenciesRecursively: false, groups: [{ name: chunkOf(at(entry)), debugName: 'main and shared' }] } }),
          postBanner: `/*! Esterway ${version}, MIT. Holds ${beside ? '' : 'Lit (BSD-3-Clause) and '}decimal.js (MIT): LICENSES.md */`,
        },
      },
    },
  };
}

/** Minifiers leave template literals as they are: styles shrink by a third, markup by its indentation. */
const smallTemplates: Plugin = {
  name: 'small-templates',
  enforce: 'pre',
  transform(code, id) {
    if (!id.includes('/src/elements/')) return undefined;
    const small = (styles: string): string =>
      transform({ filename: id, code: Buffer.from(styles), minify: true }).code.toString();
    const withSmallStyles = code.replace(/css`([^`]*)`/g, (_, styles: string) => `css\`${small(styles)}\``);
    // indentation means nothing in code, and no more than one space in markup
    return { code: withSmallStyles.replace(/\n[ \t]+/g, '\n'), map: null };
  },
};

/** The built file of each worker, by the module that it is made from. */
const WORKERS: Readonly<Record<string, string>> = { 'monte-carlo-worker': basename(workerFile), 'rows-worker': basename(rowsWorkerFile) };

/**
 * The sources start their workers as Vite serves them; a build starts the built ones. The words are put in at
 * the end, since Vite would bundle a worker of its own for what it sees.
 */
function workersFrom(built: (file: string) => string): Plugin {
  const written = /new Worker\(new URL\('\.\.\/\.\.\/([\w-]+)\.ts', import\.meta\.url\), \{ type: 'module' \}\)/g;
  return {
    name: 'workers-from',
    enforce: 'pre',
    transform(code, id) {
      if (!id.endsWith('/worker-place.ts')) return undefined;
      const found = [...code.matchAll(written)].map(([, name]) => name ?? '');
      if (found.sort().join() !== Object.keys(WORKERS).sort().join()) throw new Error('worker-place.ts starts its workers in other words');
      return { code: code.replace(written, (_, name: string) => `__esterway_${name.replaceAll('-', '$')}__`), map: null };
    },
    renderChunk: (code) => (/__esterway_[\w$]+?__/.test(code) ? { code: code.replace(/__esterway_([\w$]+?)__/g, (_, name: string) => built(WORKERS[name.replaceAll('$', '-')] ?? '')), map: null } : undefined),
  };
}

const sizeTable: Plugin = { name: 'size-table', closeBundle: printSizes };

async function tests(): Promise<ViteUserConfig> {
  const { playwright } = await import('@vitest/browser-playwright'); // slow to load, and no build needs it
  const elsewhere = ['tests/elements/**', 'tests/hostile/**', 'tests/journeys/**'];
  return {
    ...shared,
    test: {
      projects: [
        {
          extends: true,
          test: {
            name: 'unit',
            environment: 'node',
            include: ['tests/**/*.test.ts'],
            exclude: ['**/node_modules/**', ...elsewhere],
            sequence: { groupOrder: 0 },
          },
        },
        {
          extends: true,
          resolve: {
            alias: [
              // @open-wc/testing asks for a path of another test runner's server, in more than one spelling
              {
                find: /^(?:\.\.\/)*\/?__web-dev-server__web-socket\.js$/,
                replacement: at('./tests/tools/stubs/web-socket.js'),
              },
            ],
          },
          optimizeDeps: {
            include: [...runtime, '@open-wc/testing', '@open-wc/testing/pure', 'chai-a11y-axe', 'axe-core', 'fast-check'],
          },
          test: {
            name: 'browser',
            include: ['tests/elements/**/*.test.ts', 'tests/hostile/**/*.test.ts'],
            setupFiles: ['./tests/tools/browser-setup.ts'],
            testTimeout: 20_000,
            sequence: { groupOrder: 1 },
            browser: {
              enabled: true,
              headless: true,
              screenshotFailures: false,
              provider: playwright({
                contextOptions: pageDefaults,
                launchOptions: { ...(await launchPath()), args: chromiumArgs },
              }),
              instances: [{ browser: 'chromium' }],
            },
          },
        },
        {
          extends: true,
          test: {
            name: 'journeys',
            environment: 'node',
            include: ['tests/journeys/**/*.test.ts'],
            globalSetup: ['./tests/tools/journeys-setup.ts'],
            testTimeout: 60_000,
            hookTimeout: 60_000,
            pool: 'forks',
            maxWorkers: 1,
            fileParallelism: false,
            sequence: { groupOrder: 2 },
          },
        },
      ],
    },
  };
}

async function launchPath(): Promise<{ executablePath?: string }> {
  const executablePath = await chromiumPath();
  return executablePath ? { executablePath } : {};
}

export default defineConfig(async ({ mode, command }): Promise<ViteUserConfig> => {
  if (mode === 'test' || mode === 'benchmark') return tests();
  if (command === 'serve') return site;
  const build = builds[mode];
  if (!build) throw new Error(`Say which build: vite build --mode ${Object.keys(builds).join('|')}`);
  return build();
});
