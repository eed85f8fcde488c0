import { bench, describe } from 'vitest';
import { backtest } from '../../src/stats/backtests/backtest.ts';
import { walk } from '../../src/stats/backtests/walk.ts';
import { createStreams } from '../../src/stats/random/xoshiro128.ts';
import type { TailModelName } from '../../src/stats/tails/tailFigures.ts';
import { indexReturns } from '../stats/indexWindows.ts';

// DAX and then SMI, as one history of 3,000 returns.
const returns = Float64Array.of(...indexReturns('DAX', 'all'), ...indexReturns('SMI', 'all')).slice(0, 3000);
const models = ['historical', 'normal', 'student', 'filtered', 'peaks'] as const;

const questionOf = (estimationReturns: number, asked: readonly TailModelName[]) => ({
  returns,
  firstDay: estimationReturns,
  dayCount: 2500,
  estimationReturns,
  tailLevel: { digits: 99, places: 2 },
  models: asked,
  streams: createStreams(new Uint8Array(32).fill(7)),
});

const once = { iterations: 3, time: 0, warmupIterations: 1, warmupTime: 0 };

// Goals on one core: 2,500 days, five models, 250 returns before each day: under 1.5 s, the simulated ES test included.
describe('2,500 days, window 250', () => {
  const question = questionOf(250, models);
  bench('five models, all tests (goal 1.5 s)', () => void backtest(question), once);
  for (const model of models)
    bench(`${model}, forecasts alone`, () => void walk([model], question, {}), once);
});

// With GARCH in the place of the exponentially weighted mean: under 6 s.
describe('2,500 days, window 500', () => {
  const question = questionOf(500, models);
  bench('five models, all tests (goal 6 s)', () => void backtest(question), once);
  bench('filtered by GARCH, forecasts alone', () => void walk(['filtered'], question, {}), once);
});
