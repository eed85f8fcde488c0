import { measureSuite, promisedGrid } from './suite.ts';
import { historicalProcedures } from './tailProcedures.ts';

measureSuite({
  name: 'historicalTail',
  procedures: historicalProcedures,
  grid: promisedGrid,
  levels: ['0.95'],
});
