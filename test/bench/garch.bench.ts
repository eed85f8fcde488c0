import { bench, describe } from 'vitest';
import { filteredTail } from '../../src/stats/tails/filtered/filteredTail.ts';
import { fitGarch } from '../../src/stats/volatility/garch.ts';
import { level, level95 } from '../stats/levels.ts';
import { testStreams } from '../stats/testStreams.ts';
import { simulateGarchReturns } from '../stats/volatility/simulateReturns.ts';

const process = { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 } as const;
const returns = simulateGarchReturns(2_000, process, 5, 1);
const unclustered = simulateGarchReturns(2_000, { mu: 0.0005, omega: 1e-4, alpha: 0, beta: 0 }, 5, 2);
const yesterday = fitGarch(returns.slice(0, -1));
const question = { returns, tailLevel: level('0.99'), confidence: level95, streams: testStreams(1) };

describe('GARCH(1,1) with Student innovations, 2,000 returns: under 60 ms with clustering, from yesterday’s fit under 5 ms', () => {
  bench('from all starts', () => void fitGarch(returns));
  bench('from all starts, without clustering to be found', () => void fitGarch(unclustered));
  if (yesterday.ok) bench('from yesterday’s fit', () => void fitGarch(returns, { near: yesterday.value }));
});

describe('filtered tail with its interval, 2,000 returns: under 800 ms, the exponential filter under 300 ms', () => {
  bench('GARCH, 199 refits', () => void filteredTail(question, { kind: 'garch' }), {
    iterations: 3,
    time: 0,
    warmupTime: 0,
  });
  bench('exponential, 999 resamples', () => void filteredTail(question, { kind: 'ewma' }), {
    iterations: 3,
    time: 0,
    warmupTime: 0,
  });
});
