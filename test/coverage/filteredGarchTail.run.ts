import { filteredProcedures } from './filteredProcedures.ts';
import type { Procedure } from './simulate.ts';
import { measureSuite, promisedGrid } from './suite.ts';

/** From 500 returns up GARCH is the filter. */
const garchGrid = promisedGrid.map(({ process }) => ({ process, counts: [500, 1_000] }));

/**
 * Each resample is a GARCH fit, so only 79 of the 199 that a reply makes: (B + 1)·0.025 is whole, the ends scatter a little
 * more, and the two million fits of the suite take a quarter of an hour of one processor.
 */
const mostResamples = 79;

const procedures = filteredProcedures.map(
  (procedure): Procedure => ({
    ...procedure,
    ends: (sample) => procedure.ends({ ...sample, replicates: Math.min(sample.replicates, mostResamples) }),
  }),
);

measureSuite({ name: 'filteredGarchTail', procedures, grid: garchGrid, levels: ['0.95'] });
