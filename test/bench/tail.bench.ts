import { bench, describe } from 'vitest';
import { filteredTail } from '../../src/stats/tails/filtered/filteredTail.ts';
import { historicalTail } from '../../src/stats/tails/historicalTail.ts';
import { normalTail } from '../../src/stats/tails/normalTail.ts';
import { peaksTail } from '../../src/stats/tails/peaks/peaksTail.ts';
import { studentTail } from '../../src/stats/tails/studentTail.ts';
import { level, level95 } from '../stats/levels.ts';
import { testStreams } from '../stats/testStreams.ts';
import { simulateGarchReturns } from '../stats/volatility/simulateReturns.ts';

const clustered = { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 } as const;
const streams = testStreams(1);
/** At 95% every interval is made; at 99% the historical one of ES is not, with so few returns. */
const question = {
  returns: simulateGarchReturns(500, clustered, 5, 5),
  tailLevel: level95,
  confidence: level95,
  streams,
};
const at99 = { ...question, tailLevel: level('0.99') };

const models = {
  historical: historicalTail,
  normal: normalTail,
  student: (input: typeof question) => studentTail(input),
  'filtered, GARCH': (input: typeof question) => filteredTail(input, { kind: 'garch' }),
  'filtered, exponential': (input: typeof question) => filteredTail(input, { kind: 'ewma' }),
  peaks: peaksTail,
} as const;

const all = Object.entries(models);

// Goal on one core: under 150 ms, both filters included, which stand side by side from 490 to 510 returns.
describe('tail: five models with their intervals, 500 returns', () => {
  bench('all at 95% (goal 150 ms)', () => all.forEach(([, model]) => void model(question)), { time: 3000 });
  bench('all at 99% (goal 150 ms)', () => all.forEach(([, model]) => void model(at99)), { time: 3000 });
  for (const [name, model] of all) bench(`${name}, at 95%`, () => void model(question), { time: 1000 });
});
