import { parts } from './test/mutation/parts.mjs';

/**
 * Mutation testing of the statistics core. `npm run mutate` goes through `test/mutation/parts.mjs`; a piece is
 * `npm run mutate -- --mutate 'src/stats/mean/**'`, judged by the tests of the folder it lies in.
 */
const afterOption = (name) => process.argv[process.argv.indexOf(name) + 1];
const pattern = process.argv.includes('--mutate') ? afterOption('--mutate') : '';
const folderOf = (path) => path.replace(/\*.*$/, '').replace(/[^/]*\.ts.*$/, '');
const named = parts.find(({ name }) => name === process.env.MUTATION_PART);
const around = parts.filter(({ mutate }) =>
  mutate.some((path) => folderOf(pattern).startsWith(folderOf(path))),
);
const part = named ?? around.at(-1);

export default {
  testRunner: 'in-process',
  plugins: ['./test/mutation/runner.mjs', '@stryker-mutator/vitest-runner'],
  vitest: { configFile: 'test/vitest.mutate.config.ts' },
  mutate: part?.mutate ?? ['src/stats/**/*.ts', '!src/stats/coverage/measured/*.ts'],
  testFiles: part?.testFiles ?? ['test/stats/**/*.test.ts'],
  coverageAnalysis: 'perTest',
  concurrency: 1,
  timeoutMS: 60_000,
  timeoutFactor: 1,
  dryRunTimeoutMinutes: 30,
  tempDirName: '.stryker-tmp/sandboxes',
  ignorePatterns: [
    '.stryker-tmp',
    'dist',
    'coverage',
    'config',
    'src/feed',
    'src/workspaces',
    'test/e2e',
    'test/feed',
    'test/doubles',
    'test/questions',
  ],
  reporters: ['clear-text', 'json'],
  jsonReporter: { fileName: `.stryker-tmp/reports/${named?.name ?? 'piece'}.json` },
  clearTextReporter: { allowColor: false, logTests: false, reportTests: false, reportScoreTable: true },
  warnings: { slow: false },
  thresholds: { high: 90, low: 85, break: null },
};
