import { measureSuite, promisedGrid } from './suite.ts';
import { nuProcedure } from './tailProcedures.ts';

// The stationary distribution of the GARCH process is no Student distribution, so it has no nu to hold.
measureSuite({
  name: 'studentNu',
  procedures: [nuProcedure],
  grid: promisedGrid.filter(({ process }) => process !== 'garchT'),
  levels: ['0.95'],
});
