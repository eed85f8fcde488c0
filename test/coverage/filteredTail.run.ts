import { filteredProcedures } from './filteredProcedures.ts';
import { measureSuite, promisedGrid } from './suite.ts';

measureSuite({ name: 'filteredTail', procedures: filteredProcedures, grid: promisedGrid, levels: ['0.95'] });
