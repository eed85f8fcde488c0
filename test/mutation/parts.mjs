/**
 * The statistics core in parts that are mutated one after the other: only the part’s own sources are slowed
 * by the switches of mutants, and only its own tests (and the independent oracle) have to notice.
 */
const part = (
  name,
  { folders = [name], files = folders.map((folder) => `src/stats/${folder}/**/*.ts`), tests = folders } = {},
) => ({
  name,
  mutate: files,
  testFiles: tests
    .map((folder) => `test/stats/${folder}`)
    .map((path) => (path.endsWith('.ts') ? path : `${path}/**/*.test.ts`)),
});

const withOracle = (folder) => ({ folders: [folder], tests: [folder, 'oracle.test.ts'] });

export const parts = [
  part('moments'),
  part('returns'),
  part('dependence'),
  part('numerics'),
  part('random'),
  part('distributions', withOracle('distributions')),
  part('mean'),
  part('bootstrap'),
  part('spread'),
  part('ratio'),
  part('claims'),
  part('samples'),
  part('comparisons', withOracle('comparisons')),
  part('coverage', { files: ['src/stats/coverage/*.ts'] }),
  part('tails', {
    files: ['src/stats/tails/*.ts', 'src/stats/tails/internal/*.ts'],
    tests: ['tails/*.test.ts', 'tails/internal'],
  }),
  part('peaks', { folders: ['tails/peaks'] }),
  part('filtered', { folders: ['tails/filtered'] }),
  part('horizon', { folders: ['tails/horizon'] }),
  part('volatility'),
  part('backtests'),
];
