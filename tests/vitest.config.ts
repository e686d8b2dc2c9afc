import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    root: '.',
    include: ['src/**/*.test.ts', 'tests/**/*.test.ts'],
    testTimeout: 60_000,
    hookTimeout: 60_000,
    // Loading all rooms anew for every file costs more than most of the tests.
    isolate: false,
    maxWorkers: '100%',
    reporters: ['default', './tests/closing-line.ts'],
  },
});
