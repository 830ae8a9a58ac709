import { existsSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { svelte } from '@sveltejs/vite-plugin-svelte';
import { defineConfig } from 'vitest/config';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

/** Entry files of the programs under dist/main, by the name of the built file. */
const PROGRAMS = {
  'electron-main': 'src-main/electron/main.ts',
  'browser-host': 'src-main/browser-host/main.ts',
  'command-line': 'src-main/command-line/main.ts',
  'tally-worker': 'src-main/cohort-file/tally-worker.ts',
  'press-worker': 'src-main/press/press-worker.ts',
  'erratum-worker': 'src-main/erratum/erratum-worker.ts',
} as const;

const programs = Object.fromEntries(
  Object.entries(PROGRAMS)
    .map(([name, path]) => [name, here(path)] as const)
    .filter(([, path]) => existsSync(path)),
);

const WINDOW_TESTS = 'test/src-main/electron/**/*.test.ts';

/** Three targets in one build: the page, the programs that run under Node, and the preload script of the window. */
export default defineConfig({
  root: here('src-renderer'),
  base: './',
  publicDir: false,
  plugins: [svelte({ configFile: false })],
  // A package that evaluates text, which the page's policy forbids.
  resolve: {
    alias: { '@stdlib/assert-has-generator-support': here('src-renderer/compute/generator-support.cjs') },
  },
  worker: { format: 'es' },
  builder: {
    sharedConfigBuild: true,
    async buildApp(builder) {
      for (const name of ['client', 'main', 'preload']) {
        const environment = builder.environments[name];
        if (environment !== undefined) await builder.build(environment);
      }
    },
  },
  environments: {
    client: {
      build: {
        outDir: here('dist/renderer'),
        emptyOutDir: true,
        assetsInlineLimit: 0,
        modulePreload: { polyfill: false },
        chunkSizeWarningLimit: 2000,
        // The notices of the packages that become part of the page.
        license: { fileName: 'licences.txt' },
      },
    },
    // Packages stay in node_modules: several of them find their own files there when they run.
    main: {
      consumer: 'server',
      resolve: { noExternal: [/^@stdlib\//, /^@noble\//, 'valibot'] },
      build: {
        outDir: here('dist/main'),
        emptyOutDir: true,
        minify: false,
        target: 'node20',
        copyPublicDir: false,
        rolldownOptions: {
          input: programs,
          external: ['electron'],
          output: { format: 'es', entryFileNames: '[name].js', chunkFileNames: '[name]-[hash].js' },
        },
      },
    },
    // A sandboxed preload script can only be CommonJS.
    preload: {
      consumer: 'server',
      build: {
        outDir: here('dist/main'),
        emptyOutDir: false,
        minify: false,
        target: 'node20',
        copyPublicDir: false,
        rolldownOptions: {
          input: { preload: here('src-main/electron/preload.ts') },
          external: ['electron'],
          output: { format: 'cjs', entryFileNames: '[name].cjs' },
        },
      },
    },
  },
  test: {
    root: here('.'),
    environment: 'node',
    maxWorkers: '100%',
    // Laws are tried on many drawn cases, on machines with few and slow processors.
    testTimeout: 30_000,
    hookTimeout: 60_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'program',
          include: ['test/**/*.test.ts'],
          exclude: ['test/journey/**', WINDOW_TESTS, 'node_modules/**', '.cache/**'],
          isolate: false,
        },
      },
      // They stand something else in place of Electron, each its own.
      { extends: true, test: { name: 'window', include: [WINDOW_TESTS] } },
    ],
  },
});
