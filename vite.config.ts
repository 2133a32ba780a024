import { fileURLToPath } from 'node:url';
import react from '@vitejs/plugin-react';
import { viteSingleFile } from 'vite-plugin-singlefile';
import { defineConfig } from 'vitest/config';
import { contentPolicy } from './app/build/contentPolicy.ts';
import { licences } from './app/build/licences.ts';
import { singlePage } from './app/build/singlePage.ts';

const fromHere = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** Modes: `production` makes the served page, `single` the page as one file, `test` is Vitest's. */
export default defineConfig(({ mode }) => {
  const single = mode === 'single';
  const used = licences('licences.txt');
  return {
    // Tests name their files from the top; the page lives in app/.
    root: mode === 'test' ? fromHere('.') : fromHere('app'),
    base: './',
    publicDir: fromHere('public'),
    plugins: [
      react(),
      ...(single ? [viteSingleFile({ removeViteModuleLoader: true }), singlePage('stepwell.html')] : []),
      used.page,
      contentPolicy(single),
    ],
    // plotly.js/lib/core is written for bundlers that provide Node's name of the global object.
    define: { global: 'globalThis' },
    resolve: {
      // Styles of maps, which plotly.js asks for even where no map is drawn.
      alias: { 'maplibre-gl/dist/maplibre-gl.css': fromHere('app/build/noMapStyles.css') },
    },
    // A module worker does not start from file://.
    worker: {
      format: 'iife',
      plugins: () => [used.worker],
      // Comments would stay in the text from which the page starts its worker; the licences have a file of their own.
      rolldownOptions: { output: { comments: false } },
    },
    build: {
      target: 'es2022',
      outDir: fromHere(single ? 'dist/single' : 'dist'),
      emptyOutDir: true,
      copyPublicDir: !single,
      modulePreload: { polyfill: false },
      // Importing core/ does nothing by itself, so that what only the worker uses stays out of the page's own code.
      rolldownOptions: {
        treeshake: { moduleSideEffects: [{ test: /\/core\//, sideEffects: false }] },
        // How long a plugin took says how busy the machine was.
        checks: { bundlerTimings: false },
      },
      // One file with the drawing library and the worker in it is meant to be large.
      chunkSizeWarningLimit: 3000,
    },
    preview: { host: '127.0.0.1' },
    test: {
      reporters: ['default', fromHere('test/summaryReporter.ts')],
      projects: [
        {
          extends: true,
          test: {
            name: 'core',
            environment: 'node',
            include: ['test/**/*.test.{ts,tsx}'],
            exclude: ['test/browser/**'],
            sequence: { groupOrder: 0 },
            // Nothing here is timed: a busy machine is slow, not wrong.
            testTimeout: 60_000,
            hookTimeout: 60_000,
          },
        },
        {
          extends: true,
          test: {
            name: 'browser',
            environment: 'node',
            include: ['test/browser/**/*.test.ts'],
            globalSetup: fromHere('test/browser/globalSetup.ts'),
            // Many times what a quiet machine needs: a busy one is slow, not wrong.
            testTimeout: 90_000,
            hookTimeout: 90_000,
            // After the others, so that what is awaited in the browser does not compete with them.
            sequence: { groupOrder: 1 },
          },
        },
      ],
    },
  };
});
