import { peaksTail } from '../../src/stats/tails/peaks/peaksTail.ts';
import { measureSuite, promisedGrid } from './suite.ts';
import { tailProcedures } from './tailProcedures.ts';

/** No resample is made, so their number does not matter. */
const procedures = tailProcedures('peaks', peaksTail, () => 0);

measureSuite({ name: 'peaksTail', procedures, grid: promisedGrid, levels: ['0.95'] });
