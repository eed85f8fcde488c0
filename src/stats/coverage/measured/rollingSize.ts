import type { RollingSizeCell } from '../rollingSizeCell.ts';

/** Written by `npm run coverage-table`; not to be edited. */
export const rollingSizeMeasured: readonly RollingSizeCell[] = [
  ['normal', 'historical', 1000, 0.01171, 0.055],
  ['normal', 'normal', 1000, 0.01022, 0.095],
  ['normal', 'student', 1000, 0.0097, 0.099],
  ['normal', 'filtered', 1000, 0.01166, 0.027],
  ['normal', 'peaks', 486, 0.01126, 0.0617],
  ['studentT4', 'historical', 1000, 0.01184, 0.053],
  ['studentT4', 'normal', 1000, 0.01622, 0.133],
  ['studentT4', 'student', 1000, 0.01078, 0.086],
  ['studentT4', 'filtered', 1000, 0.01171, 0.03],
  ['studentT4', 'peaks', 838, 0.0115, 0.0525],
  ['garchT', 'historical', 1000, 0.01336, 0.195],
  ['garchT', 'normal', 1000, 0.01876, 0.303],
  ['garchT', 'student', 1000, 0.0126, 0.237],
  ['garchT', 'filtered', 1000, 0.01191, 0.033],
  ['garchT', 'peaks', 779, 0.01309, 0.2003],
];
