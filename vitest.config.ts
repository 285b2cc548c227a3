import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['test/**/*.test.ts'],
    exclude: ['test/evidence/**'],
    testTimeout: 60_000,
    coverage: { provider: 'v8', include: ['src/**/*.ts'], exclude: ['src/**/index.ts'] },
  },
});
