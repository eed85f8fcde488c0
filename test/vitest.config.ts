import { availableParallelism } from 'node:os';
import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    root: new URL('..', import.meta.url).pathname,
    include: ['test/**/*.test.ts'],
    exclude: ['test/**/*.slow.test.ts'],
    benchmark: { include: ['test/bench/**/*.bench.ts'] },
    testTimeout: 30_000,
    // the default leaves one core idle, which on a machine of two doubles the time
    maxWorkers: availableParallelism(),
  },
});
