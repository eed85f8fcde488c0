import { describe, expect, test } from 'vitest';
import { fitStudent, type StudentFit } from '../../../../src/stats/tails/studentFit.ts';
import { indexReturns } from '../../indexWindows.ts';

// A rolling Student fit climbs from the day before's. That it never stays on a lower summit is a fact about data, not a
// theorem: it is measured here on every window of four share indices.
describe.each(['DAX', 'SMI', 'CAC', 'FTSE'])('%s', (ticker) => {
  test.each([60, 250])('every window of %i returns', (size) => {
    const returns = indexReturns(ticker, 'all');
    let yesterday: StudentFit | undefined;
    let lower = 0;
    for (let day = size; day < returns.length; day += 1) {
      const window = returns.slice(day - size, day);
      const warm = fitStudent(window, yesterday);
      const cold = fitStudent(window);
      expect(warm.ok).toBe(cold.ok);
      yesterday = warm.ok ? warm.value : undefined;
      // Both stop within 1e-8 standard errors of a summit, which moves a log-likelihood by 1e-16 of itself.
      if (warm.ok && cold.ok && cold.value.logLikelihood - warm.value.logLikelihood > 1e-8) lower += 1;
    }
    expect(lower).toBe(0);
  });
});
