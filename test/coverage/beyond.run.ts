import { beyondProcedures } from './beyondProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

measureSuite({ name: 'beyond', procedures: beyondProcedures, grid: promisedGrid, levels: ['0.95'] });
