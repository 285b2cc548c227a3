import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['test/evidence/**/*.test.ts'],
    testTimeout: 3_600_000,
    reporters: ['verbose'],
    fileParallelism: false,
  },
});
