import { filteredProcedures } from './filteredProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

/** Some 2.4 million GARCH fits: an hour or two of one processor. */
const garchGrid = promisedGrid.map(({ process, counts }) => ({
  process,
  counts: counts.filter((count) => count >= 500),
}));

measureSuite({
  name: 'filteredGarchTail',
  procedures: filteredProcedures,
  grid: garchGrid,
  levels: ['0.95'],
});
