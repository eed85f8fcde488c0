import { comparisonProcedures } from './comparisonProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

// Beside the promised cells returns that follow each other, for which a comparison has no interval of its own.
measureSuite({
  name: 'comparison',
  procedures: comparisonProcedures,
  // The share of 1,000 samples has a standard error of 0.0069 at 0.95.
  grid: [...promisedGrid, { process: 'autoregressive' as const, counts: [20, 60, 250, 1_000] }].map(
    (row) => ({
      ...row,
      replications: 1_000,
    }),
  ),
  levels: ['0.95'],
});
