import { bench, describe } from 'vitest';
import { simpleReturns } from '../../src/stats/returns/returns.ts';
import { peaksBeyond } from '../../src/stats/tails/peaks/peaksBeyond.ts';
import { peaksTail } from '../../src/stats/tails/peaks/peaksTail.ts';
import { level, level95 } from '../stats/levels.ts';
import { indexCloses } from '../stats/readFixture.ts';
import { testStreams } from '../stats/testStreams.ts';

const returns = simpleReturns(indexCloses('DAX'));
const streams = testStreams(1);

describe('largest losses of 1,859 returns with all intervals: under 10 ms', () => {
  bench(
    'VaR, ES and xi',
    () => void peaksTail({ returns, tailLevel: level('0.99'), confidence: level95, streams }),
  );
  bench(
    'the chance of a loss of 4%',
    () => void peaksBeyond({ returns, threshold: 0.04, confidence: level95, streams }),
  );
});
