import { measureSuite, promisedGrid } from './suite.ts';
import { studentProcedures } from './tailProcedures.ts';

measureSuite({ name: 'studentTail', procedures: studentProcedures, grid: promisedGrid, levels: ['0.95'] });
