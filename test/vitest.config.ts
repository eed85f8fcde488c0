import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    root: new URL('..', import.meta.url).pathname,
    include: ['test/**/*.test.ts'],
    exclude: ['test/**/*.slow.test.ts'],
    benchmark: { include: ['test/bench/**/*.bench.ts'] },
    testTimeout: 30_000,
  },
});
