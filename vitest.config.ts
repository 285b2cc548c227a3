import { defineConfig } from 'vitest/config';

/** Where .ci/run wants the counts; absent on a user's machine. */
const report = process.env.IRISLOOM_TEST_REPORT;

export default defineConfig({
  test: {
    include: ['test/**/*.test.ts'],
    exclude: ['test/evidence/**'],
    testTimeout: 60_000,
    hookTimeout: 60_000,
    reporters: report === undefined ? ['default'] : ['default', 'json'],
    ...(report === undefined ? {} : { outputFile: { json: report } }),
    coverage: { provider: 'v8', include: ['src/**/*.ts'], exclude: ['src/**/index.ts'] },
  },
});
