import { describe, expect, test } from 'vitest';
import { coverageTest } from '../../../src/stats/backtests/coverage.ts';
import { binomialMass } from '../../../src/stats/distributions/binomial.ts';
import { studentTQuantile } from '../../../src/stats/distributions/studentT.ts';
import { nextOpenDouble } from '../../../src/stats/random/draws.ts';
import { tailFraction } from '../../../src/terms/level.ts';
import { level } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const days = 250;

/** How often the chi-square verdict at 5% rejects a right model: the binomial chances of the counts that it rejects. */
const enumeratedSize = (text: string): number => {
  const tailLevel = level(text);
  return Array.from({ length: days + 1 }, (_, count) => count)
    .filter((count) => coverageTest(count, days, tailLevel).p < 0.05)
    .reduce((sum, count) => sum + binomialMass(count, days, tailFraction(tailLevel)), 0);
};

/** 4,000 histories of t(4) losses judged by their true VaR. */
const simulatedSize = (text: string): number => {
  const tailLevel = level(text);
  const valueAtRisk = -studentTQuantile(tailFraction(tailLevel), 4);
  const streams = testStreams(95);
  let rejected = 0;
  for (let history = 0; history < 4000; history += 1) {
    const random = streams.stream(history);
    let exceedances = 0;
    // One uniform number a day is the chance of the day's loss: beyond VaR where the t quantile of it is.
    for (let day = 0; day < days; day += 1) {
      const chance = nextOpenDouble(random);
      if (chance < 0.06 && -studentTQuantile(chance, 4) > valueAtRisk) exceedances += 1;
    }
    if (coverageTest(exceedances, days, tailLevel).p < 0.05) rejected += 1;
  }
  return rejected / 4000;
};

// 9.48% and 7.44%: SciPy 1.17.1, sum of scipy.stats.binom.pmf(x, 250, p) over the x whose ratio exceeds 3.841458820694124.
describe.each([
  ['0.99', 0.0948],
  ['0.975', 0.0744],
] as const)('size of the chi-square coverage verdict on 250 days at %s', (text, size) => {
  test('by enumeration', () => {
    expect(Math.abs(enumeratedSize(text) - size)).toBeLessThan(0.00005);
  });

  test('by simulation with the true VaR, within three binomial standard errors', () => {
    const error = Math.sqrt((size * (1 - size)) / 4000);
    expect(Math.abs(simulatedSize(text) - size)).toBeLessThan(3 * error);
  });
});
