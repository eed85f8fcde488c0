import { describe, expect, test } from 'vitest';
import { coverageTest } from '../../../src/stats/backtests/coverage.ts';
import {
  rejectedWithTrueFigure,
  rollingSize,
  rollingSizeSetting,
} from '../../../src/stats/coverage/rollingSize.ts';
import { binomialMass } from '../../../src/stats/distributions/binomial.ts';
import { tailFraction } from '../../../src/terms/level.ts';
import { level } from '../levels.ts';

describe('how often a rolling backtest rejects by chance', () => {
  test('is told of the simulated process that comes nearest', () => {
    expect(rollingSize('autoregressive').process).toBe('normal');
    expect(rollingSize('exponential').process).toBe('studentT4');
    for (const process of ['normal', 'studentT4', 'garchT'] as const) {
      const { process: found, rejected } = rollingSize(process);
      expect(found).toBe(process);
      expect(rejected.map(({ model }) => model)).toEqual([
        'historical',
        'normal',
        'student',
        'filtered',
        'peaks',
      ]);
      for (const { share } of rejected) expect(share > 0 && share < 0.5).toBe(true);
    }
  });

  test('clustering makes every model that does not follow it rejected far more often than the filtered one', () => {
    const shares = new Map(rollingSize('garchT').rejected.map(({ model, share }) => [model, share]));
    for (const model of ['historical', 'normal', 'student', 'peaks'] as const)
      expect(shares.get(model)).toBeGreaterThan(4 * (shares.get('filtered') ?? 1));
  });

  test('beside what the true figure brings, enumerated over the counts of exceedances', () => {
    const { judgedDays, tailLevel } = rollingSizeSetting;
    const at = level(tailLevel);
    let rejected = 0;
    for (let count = 0; count <= judgedDays; count += 1)
      if (coverageTest(count, judgedDays, at).p < 0.05)
        rejected += binomialMass(count, judgedDays, tailFraction(at));
    // The share is written with four decimals.
    expect(Math.abs(rejected - rejectedWithTrueFigure)).toBeLessThan(0.00005);
  });
});
