import { expect, test } from 'vitest';
import { coverageTable } from '../../src/stats/coverage/table.ts';
import { meanProcedures } from './meanProcedures.ts';
import { simulateCell } from './simulate.ts';
import { replicationsPerCell, sourceOf } from './suite.ts';

test.each(['mean.plain', 'mean.neweyWest'] as const)(
  'the table holds what the simulation of %s gives today',
  (name) => {
    const procedure = meanProcedures.find((one) => one.name === name);
    if (procedure === undefined) throw new Error(`no procedure ${name}`);
    const measured = simulateCell({
      procedure,
      process: 'studentT4',
      count: 20,
      level: '0.95',
      replications: replicationsPerCell,
    });
    // Exact: the streams are seeded by the cell itself. A change of the interval or of the generators shows here, and
    // then `npm run coverage-table` has to be run again.
    expect(coverageTable).toContainEqual(measured);
  },
);

test('a file of the table is valid source', () => {
  expect(sourceOf('meanCoverage', [['mean.plain', 'normal', 20, '0.95', 0.9512, 4_000, 0]])).toBe(
    [
      "import type { CoverageCell } from '../cell.ts';",
      '',
      '/** Written by `npm run coverage-table`; not to be edited. */',
      'export const meanCoverage: readonly CoverageCell[] = [',
      "  ['mean.plain', 'normal', 20, '0.95', 0.9512, 4000, 0],",
      '];',
      '',
    ].join('\n'),
  );
});
