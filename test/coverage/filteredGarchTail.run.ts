import { filteredProcedures } from './filteredProcedures.ts';
import type { Procedure } from './simulate.ts';
import { type Grid, measureSuite } from './suite.ts';

/**
 * From 500 returns up GARCH is the filter. Each sample costs a hundred fits, so there are fewer: at 0.95 the shares have standard
 * errors of 0.0145, 0.0097 and 0.0073, the smallest on returns that the filter is made for.
 */
const garchGrid: Grid = [
  { process: 'normal', counts: [500, 1_000], replications: 225 },
  { process: 'studentT4', counts: [500, 1_000], replications: 500 },
  { process: 'garchT', counts: [500, 1_000], replications: 900 },
];

/**
 * Each resample is a GARCH fit, so only 79 of the 199 that a reply makes: (B + 1)·0.025 is whole, the ends scatter a little more.
 */
const mostResamples = 79;

const procedures = filteredProcedures.map(
  (procedure): Procedure => ({
    ...procedure,
    ends: (sample) => procedure.ends({ ...sample, replicates: Math.min(sample.replicates, mostResamples) }),
  }),
);

measureSuite({ name: 'filteredGarchTail', procedures, grid: garchGrid, levels: ['0.95'] });
