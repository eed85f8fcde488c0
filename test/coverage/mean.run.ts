import { meanProcedures } from './meanProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

// Beside the promised cells: the processes for which the alternatives to the plain interval exist, and very few returns.
measureSuite({
  name: 'mean',
  procedures: meanProcedures,
  grid: [
    ...promisedGrid,
    { process: 'autoregressive', counts: [10, 20, 60, 250, 1_000] },
    { process: 'exponential', counts: [10, 20, 60, 250] },
    { process: 'studentT3', counts: [10, 20, 60, 250] },
    { process: 'normal', counts: [10] },
  ],
  levels: ['0.95'],
});
