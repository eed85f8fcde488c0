import { describe, expect, test } from 'vitest';
import type { NewtonMaximum } from '../../../../src/stats/numerics/boundedNewton.ts';
import { noClustering, refuseMaximum } from '../../../../src/stats/volatility/internal/garchOutcome.ts';
import { largestInverseNu } from '../../../../src/stats/volatility/internal/garchSearch.ts';

const maximumAt = (alpha: number, beta: number, inverseNu = 0.2, converged = true): NewtonMaximum => ({
  converged,
  value: -800,
  point: Float64Array.of(0, -2, alpha, beta, inverseNu),
  side: new Int8Array(5),
  standardErrors: new Float64Array(5),
  steps: 6,
});

const refusal = (maximum: NewtonMaximum) => {
  const found = refuseMaximum(maximum, 750);
  return found === null ? null : [found.problem.code, found.problem.message];
};

describe('the end of a GARCH climb', () => {
  test('a maximum inside the range is reported', () => {
    expect(refusal(maximumAt(0.05, 0.9))).toBeNull();
    expect(refusal(maximumAt(0.25, 0.7498))).toBeNull();
  });

  test('a variance without a long-run level is refused with its sum', () => {
    expect(refusal(maximumAt(0.25, 0.75))).toEqual([
      'varianceNotStationary',
      expect.stringMatching(
        /^The GARCH fit has alpha \+ beta = 1\.0000, and from 0\.9999 up its volatility has no long-run level\. Ask for a longer window/,
      ),
    ]);
    // 0.5 + 0.4999 is 0.9999 in doubles, the bound itself.
    expect(refusal(maximumAt(0.5, 0.4999))?.[0]).toBe('varianceNotStationary');
  });

  test('two degrees of freedom are refused, more are not', () => {
    expect(refusal(maximumAt(0.05, 0.9, largestInverseNu))).toEqual([
      'varianceNotStationary',
      expect.stringMatching(/^The GARCH fit runs into 2 degrees of freedom/),
    ]);
    expect(refusal(maximumAt(0.05, 0.9, 0.49))).toBeNull();
  });

  test('a climb that did not finish is refused with the count of returns', () => {
    expect(refusal(maximumAt(0.05, 0.9, 0.2, false))).toEqual([
      'fitNotConverged',
      expect.stringContaining('to these 750 returns did not reach its stopping rule'),
    ]);
  });

  test('alpha on 0 is no clustering', () => {
    expect(noClustering(maximumAt(0, 0.9))).toBe(true);
    expect(noClustering(maximumAt(1e-9, 0.9))).toBe(false);
  });
});
