import { expect, test } from 'vitest';
import { coverageTable } from '../../src/stats/coverage/table.ts';
import { simulateCell } from './simulate.ts';
import { replicationsPerCell } from './suite.ts';
import { historicalProcedures, normalProcedures, studentProcedures } from './tailProcedures.ts';

test.each(['tail.student.es.0.99', 'tail.normal.var.0.99', 'tail.historical.var.0.95'] as const)(
  'the table holds what the simulation of %s gives today',
  { timeout: 600_000 },
  (name) => {
    const all = [...studentProcedures, ...normalProcedures, ...historicalProcedures];
    const procedure = all.find((one) => one.name === name);
    if (procedure === undefined) throw new Error(`no procedure ${name}`);
    const cell = { procedure, process: 'studentT4', count: 20, level: '0.95' } as const;
    // Exact, as in the quick test of the table.
    expect(coverageTable).toContainEqual(simulateCell({ ...cell, replications: replicationsPerCell }));
  },
);
