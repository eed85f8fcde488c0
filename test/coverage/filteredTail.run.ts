import { filteredProcedures } from './filteredProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

/** Counts at which the exponentially weighted mean is the filter; GARCH takes hours and is a suite of its own. */
const ewmaGrid = promisedGrid.map(({ process, counts }) => ({
  process,
  counts: counts.filter((count) => count < 500),
}));

measureSuite({ name: 'filteredTail', procedures: filteredProcedures, grid: ewmaGrid, levels: ['0.95'] });
