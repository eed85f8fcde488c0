import { expect, test } from 'vitest';
import { nonGreenChance } from '../../../src/stats/backtests/nonGreenChance.ts';
import { levelFromPercent } from '../../../src/terms/level.ts';
import { relativeError } from '../../laws/relativeError.ts';

const level = (percent: string) => {
  const read = levelFromPercent(percent);
  if (read === null) throw new RangeError(percent);
  return read;
};

test('250 days at 99%: the share of right models outside the green zone', () => {
  // Basel Committee on Banking Supervision, January 1996, table 1: four exceedances or fewer 89.2%, so five or more 10.8%
  expect(nonGreenChance(250, level('99'))?.toFixed(3)).toBe('0.108');
});

// relative 1e-12: what the binomial tail is held to
test.each([
  // scipy 1.17: binom.sf(k - 1, n, p), k the least with binom.cdf(k, n, p) >= 0.95: 5, 11 and 9
  [250, '99', 0.1078123730963749],
  [250, '97.5', 0.05153861106248657],
  [500, '99', 0.06711015991370481],
])('%i days at %s%%', (days, percent, expected) => {
  expect(relativeError(nonGreenChance(days, level(percent)) ?? Number.NaN, expected)).toBeLessThan(1e-12);
});

test('there are no zones where few exceedances are expected', () => {
  expect(nonGreenChance(100, level('99'))).toBe(null);
});
