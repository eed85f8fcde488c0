import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    root: new URL('..', import.meta.url).pathname,
    include: ['test/**/*.slow.test.ts'],
    testTimeout: 1_800_000,
  },
});
