import { expect, test } from 'vitest';
import { meanInterval } from '../../../src/stats/mean/interval.ts';
import { meanLadder } from '../../../src/stats/mean/ladder.ts';
import { neweyWestInterval } from '../../../src/stats/mean/neweyWestInterval.ts';
import { predictionInterval } from '../../../src/stats/mean/prediction.ts';
import { stationaryBootstrapInterval } from '../../../src/stats/mean/stationaryBootstrap.ts';
import { studentisedBootstrapInterval } from '../../../src/stats/mean/studentisedBootstrap.ts';
import { meanWidths } from '../../../src/stats/mean/widths.ts';
import { refusalMessage } from '../../laws/outcomes.ts';
import { level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const one = [0.01];
const drawn = { returns: one, level: level95, side: 'both', streams: testStreams(21) } as const;

test.each([
  ['An interval for the mean', 2, meanInterval(one, level95, 'both')],
  ['An interval for the mean', 2, meanLadder(one, 'both')],
  ['An interval for the mean', 2, meanWidths(one, level95, 'both')],
  ['A prediction for one further return', 2, predictionInterval(one, level95, 'both')],
  ['An interval that allows for autocorrelation', 20, neweyWestInterval(one, level95, 'both')],
  ['A bootstrap interval for the mean', 10, stationaryBootstrapInterval(drawn)],
  ['A bootstrap interval for the mean', 10, studentisedBootstrapInterval(drawn)],
])('%s needs %d returns, and the refusal says so', (figure, least, refused) => {
  expect(refusalMessage(refused)).toContain(`${figure} needs at least ${least} returns, and there is 1.`);
});
