import { bench, describe } from 'vitest';
import { stationaryBootstrapInterval } from '../../src/stats/mean/stationaryBootstrap.ts';
import { studentisedBootstrapInterval } from '../../src/stats/mean/studentisedBootstrap.ts';
import { trustedMeanInterval } from '../../src/stats/mean/trustedInterval.ts';
import { createStreams } from '../../src/stats/random/xoshiro128.ts';
import { simpleReturns } from '../../src/stats/returns/returns.ts';
import { blockDeviationInterval } from '../../src/stats/spread/blockInterval.ts';
import { indexCloses } from '../stats/readFixture.ts';

// A whole reply has 15 ms; 9,999 resamples of 60 returns should take less than 10 ms of them.
const returns = simpleReturns(indexCloses('DAX').slice(-61));
const question = {
  returns,
  level: { digits: 95, places: 2 },
  side: 'both',
  streams: createStreams(new Uint8Array(32).fill(7)),
} as const;

describe('60 returns, 9,999 resamples', () => {
  bench('studentised bootstrap of the mean', () => void studentisedBootstrapInterval(question));
  bench('stationary bootstrap of the mean', () => void stationaryBootstrapInterval(question));
  bench('stationary bootstrap of the deviation', () => void blockDeviationInterval(question));
  bench('which interval of the mean to trust', () => void trustedMeanInterval(question));
});
