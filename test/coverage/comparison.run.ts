import { comparisonProcedures } from './comparisonProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

// Beside the promised cells returns that follow each other, for which a comparison has no interval of its own.
measureSuite({
  name: 'comparison',
  procedures: comparisonProcedures,
  grid: [...promisedGrid, { process: 'autoregressive', counts: [20, 60, 250, 1_000] }],
  levels: ['0.95'],
});
