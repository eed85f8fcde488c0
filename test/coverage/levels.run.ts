import { deviationProcedures } from './deviationProcedures.ts';
import { meanProcedures } from './meanProcedures.ts';
import { type Grid, measureSuite, promisedGrid } from './suite.ts';
import { studentProcedures } from './tailProcedures.ts';

/** The levels beside 95% that people ask for. */
const levels = ['0.9', '0.99'];

/** Fewer samples than at 95%: the share of 625 has a standard error of 0.012 at 0.9 and 0.004 at 0.99, that of 1,000 of 0.0095 and 0.0031. */
const gridOf = (replications: number): Grid => promisedGrid.map((row) => ({ ...row, replications }));

measureSuite({ name: 'meanLevels', procedures: meanProcedures, grid: gridOf(625), levels });
measureSuite({ name: 'deviationLevels', procedures: deviationProcedures, grid: gridOf(1_000), levels });
measureSuite({ name: 'studentTailLevels', procedures: studentProcedures, grid: gridOf(900), levels });
