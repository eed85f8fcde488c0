import { describe, expect, test } from 'vitest';
import { coverageTest, exactCoverageP } from '../../../src/stats/backtests/coverage.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { coverageCase, levelOfFailure } from './coverageFixture.ts';

type Value = {
  readonly exceptions: number;
  readonly observations: number;
  readonly failure_probability: number;
  readonly lr: number;
  readonly p_value: number;
};

describe('coverage ratio against mpmath at 30 digits', () => {
  test.each(coverageCase<Value>('unconditional_coverage_values'))(
    '$exceptions of $observations at $failure_probability',
    ({ exceptions, observations, failure_probability, lr, p_value }) => {
      const { likelihoodRatio, p } = coverageTest(
        exceptions,
        observations,
        levelOfFailure(failure_probability),
      );
      // The fixture holds 16 digits; 1e-13 leaves room for the cancellation of two logarithms near the expected count.
      expect(relativeError(likelihoodRatio, lr)).toBeLessThan(1e-13);
      // A tail probability magnifies the ratio's error by up to half the ratio; 250 of 250 lies at exp(-1151), 0 in the fixture.
      expect(relativeError(p, p_value)).toBeLessThan(1e-12);
    },
  );
});

type Region = {
  readonly failure_probability: number;
  readonly observations: number;
  readonly recomputed_smallest_accepted: number;
  readonly recomputed_largest_accepted: number;
  readonly lr_at_recomputed_ends: readonly number[];
  readonly lr_just_outside: readonly number[];
};

// Kupiec 1995: 14 of his 15 regions are these; for 255 days at 99% the printed region accepts no exceedance at all, where
// the ratio (5.126) rejects.
describe('non-rejection regions of Kupiec 1995 as recomputed', () => {
  test.each(coverageCase<Region>('kupiec_non_rejection_regions'))(
    '$observations days at $failure_probability',
    (region) => {
      const level = levelOfFailure(region.failure_probability);
      const smallest = region.recomputed_smallest_accepted;
      const largest = region.recomputed_largest_accepted;
      const ratio = (count: number) => coverageTest(count, region.observations, level).likelihoodRatio;
      const accepted = Array.from({ length: region.observations + 1 }, (_, count) => count).filter(
        (count) => coverageTest(count, region.observations, level).p > 0.05,
      );
      expect(accepted[0]).toBe(smallest);
      expect(accepted.at(-1)).toBe(largest);
      expect(accepted).toHaveLength(largest - smallest + 1);
      const expected = [...region.lr_at_recomputed_ends, ...region.lr_just_outside];
      [smallest, largest, smallest - 1, largest + 1].forEach((count, index) => {
        // 16 digits in the fixture, as above.
        expect(relativeError(ratio(count), expected[index] ?? Number.NaN)).toBeLessThan(1e-13);
      });
    },
  );
});

describe('exact two-sided coverage', () => {
  // SciPy 1.17.1: scipy.stats.binomtest(x, 250, 0.01).pvalue, good to about 13 digits.
  test.each([
    [0, 0.18887088925855633],
    [2, 1],
    [6, 0.041183184069848354],
    [7, 0.013701447855203663],
  ])('%i exceedances in 250 days at 99%%', (count, p) => {
    expect(relativeError(exactCoverageP(count, 250, levelOfFailure(0.01)), p)).toBeLessThan(1e-11);
  });

  test('a count that is not one is a bug of the caller', () => {
    expect(() => exactCoverageP(3, 2, levelOfFailure(0.01))).toThrow(
      /^exactCoverageP: 3 exceedances in 2 days is not a count/,
    );
    for (const [exceedances, days] of [
      [0.5, 2],
      [1, 2.5],
      [-1, 2],
      [0, 0],
    ] as const)
      expect(() => coverageTest(exceedances, days, levelOfFailure(0.01))).toThrow(/^coverageTest: /);
    // Every day may be an exceedance, and none.
    expect(coverageTest(1, 1, levelOfFailure(0.01)).p).toBeLessThan(0.05);
    expect(coverageTest(0, 1, levelOfFailure(0.01)).p).toBeGreaterThan(0.5);
  });
});
