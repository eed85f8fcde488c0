import { defineConfig } from 'vitest/config';

/** The tests that a changed statistic must fail: those of the core, without the long simulations. */
export default defineConfig({
  test: {
    root: new URL('..', import.meta.url).pathname,
    include: ['test/stats/**/*.test.ts'],
    exclude: ['test/**/*.slow.test.ts'],
    testTimeout: 30_000,
  },
});
