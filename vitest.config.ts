import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    include: ['test/**/*.test.ts'],
    reporters: ['default', './test/support/closingLine.ts'],
    setupFiles: ['./test/support/seed.ts'],
    testTimeout: 120_000,
    maxWorkers: 2,
  },
});
