import { ratioInterval } from '../../src/stats/ratio/interval.ts';
import { valueOrNull } from '../../src/terms/result.ts';
import { trueDeviation, trueMean } from './processes.ts';
import { measureSuite, promisedGrid } from './suite.ts';

measureSuite({
  name: 'ratio',
  procedures: [
    {
      name: 'ratio.noncentralT',
      ends: ({ returns, level }) => valueOrNull(ratioInterval(returns, level)),
      truth: () => trueMean / trueDeviation,
    },
  ],
  grid: promisedGrid,
  levels: ['0.95'],
});
