import { deviationProcedures } from './deviationProcedures.ts';
import { meanProcedures } from './meanProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';
import { studentProcedures } from './tailProcedures.ts';

/** The levels beside 95% that people ask for. Fewer samples: a share near 0.9 has a standard error of 0.0095 from 1,000. */
const levels = ['0.9', '0.99'];
const replications = 1_000;

measureSuite({ name: 'meanLevels', procedures: meanProcedures, grid: promisedGrid, levels, replications });
measureSuite({
  name: 'deviationLevels',
  procedures: deviationProcedures,
  grid: promisedGrid,
  levels,
  replications,
});
measureSuite({
  name: 'studentTailLevels',
  procedures: studentProcedures,
  grid: promisedGrid,
  levels,
  replications,
});
