import { defineConfig } from 'vitest/config';

/** `npm run coverage-table` measures everything anew; `npm run coverage-table -- mean` one suite. */
export default defineConfig({
  test: {
    root: new URL('../..', import.meta.url).pathname,
    include: ['test/coverage/**/*.run.ts'],
    fileParallelism: false,
    testTimeout: 7_200_000,
  },
});
