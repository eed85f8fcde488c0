import { measureSuite, promisedGrid } from './suite.ts';
import { normalProcedures } from './tailProcedures.ts';

measureSuite({ name: 'normalTail', procedures: normalProcedures, grid: promisedGrid, levels: ['0.95'] });
