import { deviationProcedures } from './deviationProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

measureSuite({
  name: 'deviation',
  procedures: deviationProcedures,
  grid: promisedGrid,
  levels: ['0.95'],
});
