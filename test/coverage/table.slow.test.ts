import { expect, test } from 'vitest';
import { coverageTable } from '../../src/stats/coverage/table.ts';
import { meanProcedures } from './meanProcedures.ts';
import { simulateCell } from './simulate.ts';
import { replicationsPerCell } from './suite.ts';

const resampled = ['mean.studentised', 'mean.stationary', 'mean.trusted'] as const;

test.each(resampled.flatMap((name) => [20, 60].map((count) => [name, count] as const)))(
  'the table holds what the simulation of %s gives today for %i returns',
  (name, count) => {
    const procedure = meanProcedures.find((one) => one.name === name);
    if (procedure === undefined) throw new Error(`no procedure ${name}`);
    // Exact, as in the quick test of the table.
    expect(coverageTable).toContainEqual(
      simulateCell({ procedure, process: 'garchT', count, level: '0.95', replications: replicationsPerCell }),
    );
  },
);
