import { relative, resolve } from 'node:path';
import { playwright } from '@vitest/browser-playwright';
import { defineConfig } from 'vitest/config';
import { CHROMIUM, CHROMIUM_ARGUMENTS } from './test/chromium/executable.js';

/** Where .ci/run wants the counts; absent on a user's machine. */
const report = process.env.IRISLOOM_CHROMIUM_TEST_REPORT;

if (CHROMIUM === undefined)
  process.stderr.write(
    'No Chromium found (IRISLOOM_CHROMIUM names one): the tests of the core in Chromium are skipped.\n',
  );

const SUITE = resolve(import.meta.dirname, 'test/chromium/suite');

/** Tests of what exists under Node only, and one that holds for the rounding of one engine. */
const LEFT_OUT: readonly string[] = [
  'test/accuracy/limits.test.ts', // wants noise of more than 10 % at one frequency at -320 dB; here it is 2 % at that one
  'test/bundle/**', // builds with vite
  'test/chromium/**', // starts Chromium
  'test/command-line/**', // files, processes, terminal
  'test/evidence/**', // the long runs
  'test/fences/**', // reads the sources with the compiler
  'test/package/**', // npm and the compiler
  'test/report/document/policy.test.ts', // digests by node:crypto; Chromium itself checks them in test/chromium
  'test/report/pictures/network/drawings.test.ts', // an XML parser of Python; test/chromium uses that of Chromium
];

export default defineConfig({
  cacheDir: 'node_modules/.vite-chromium',
  plugins: [
    {
      name: 'paths of the test server',
      enforce: 'pre',
      transform(code, id) {
        if (!id.startsWith(resolve(import.meta.dirname, 'test'))) return null;
        const folder = `/${relative(import.meta.dirname, resolve(id.split('?')[0] ?? '', '..'))}`;
        return { code: code.replaceAll('import.meta.dirname', JSON.stringify(folder)), map: null };
      },
    },
  ],
  resolve: {
    alias: {
      'node:fs': resolve(SUITE, 'node-fs.ts'),
      'node:path': resolve(SUITE, 'node-path.ts'),
      'node:child_process': resolve(SUITE, 'node-child-process.ts'),
    },
  },
  optimizeDeps: { include: ['complex.js', 'd3-scale', 'd3-shape', 'decimal.js', 'fast-check', 'ml-matrix', 'zod'] },
  test: {
    include: CHROMIUM === undefined ? [] : ['test/**/*.test.ts'],
    exclude: [...LEFT_OUT],
    passWithNoTests: CHROMIUM === undefined,
    setupFiles: [resolve(SUITE, 'globals.ts')],
    testTimeout: 120_000,
    reporters: report === undefined ? ['default'] : ['default', 'json'],
    ...(report === undefined ? {} : { outputFile: { json: report } }),
    browser: {
      enabled: true,
      headless: true,
      screenshotFailures: false,
      provider: playwright({
        launchOptions: {
          args: [...CHROMIUM_ARGUMENTS],
          ...(CHROMIUM === undefined ? {} : { executablePath: CHROMIUM }),
        },
      }),
      instances: [{ browser: 'chromium' }],
    },
  },
});
