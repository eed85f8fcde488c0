import { beyondProcedures } from './beyondProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

// The share of 550 samples has a standard error of 0.0093 at 0.95.
const grid = promisedGrid.map((row) => ({ ...row, replications: 550 }));

measureSuite({ name: 'beyond', procedures: beyondProcedures, grid, levels: ['0.95'] });
