import { describe, expect, test } from 'vitest';
import { coverageTest } from '../../../src/stats/backtests/coverage.ts';
import { arrangementClasses, exactIndependenceP } from '../../../src/stats/backtests/exactIndependence.ts';
import { conditionalCoverageTest, independenceTest } from '../../../src/stats/backtests/independence.ts';
import { transitionsOf } from '../../../src/stats/backtests/transitions.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { coverageCase, levelOfFailure } from './coverageFixture.ts';

type Sequence = {
  readonly name: string;
  readonly failure_probability: number;
  readonly observations: number;
  readonly exceptions: number;
  readonly n00: number;
  readonly n01: number;
  readonly n10: number;
  readonly n11: number;
  readonly lr_unconditional: number;
  readonly lr_independence: number;
  readonly p_independence: number;
  readonly lr_conditional_sum: number;
  readonly p_conditional_sum: number;
  readonly hits: string;
};

// mpmath 1.2.1 at 30 digits, and R 4.2.2 by numerical maximisation (agreement 2e-14).
describe.each(coverageCase<Sequence>('independence_and_conditional_coverage'))('$name', (sequence) => {
  const hits = Uint8Array.from(sequence.hits, Number);
  const transitions = transitionsOf(hits);

  test('transitions', () => {
    const { n00, n01, n10, n11 } = sequence;
    expect(transitions).toEqual({ n00, n01, n10, n11 });
  });

  test('independence and conditional coverage', () => {
    const { exceptions, observations, failure_probability } = sequence;
    const coverage = coverageTest(exceptions, observations, levelOfFailure(failure_probability));
    const independence = independenceTest(transitions);
    const conditional = conditionalCoverageTest(coverage, independence);
    // Log-likelihoods of up to 100 are subtracted: 1e-13 absolute, and no more on the ratios.
    expect(Math.abs(coverage.likelihoodRatio - sequence.lr_unconditional)).toBeLessThan(2e-13);
    expect(Math.abs(independence.likelihoodRatio - sequence.lr_independence)).toBeLessThan(2e-13);
    expect(Math.abs(conditional.likelihoodRatio - sequence.lr_conditional_sum)).toBeLessThan(4e-13);
    // An error e of the ratio moves a tail probability by the factor exp(e/2).
    expect(relativeError(independence.p, sequence.p_independence)).toBeLessThan(1e-12);
    expect(relativeError(conditional.p, sequence.p_conditional_sum)).toBeLessThan(1e-12);
  });
});

describe('exact independence', () => {
  // Python 3 integers and fractions: sum of comb(x-1,r-1)*comb(T-x-1,g-1) over comb(T,x) for the arrangements whose ratio
  // reaches that of the sequence less 1e-9; the ratio in double precision.
  test.each([
    ['five_consecutive_250', 3.146974734513344e-8],
    ['two_pairs_and_one_250', 0.0018967131422385375],
  ])('%s', (name, p) => {
    const sequence = coverageCase<Sequence>('independence_and_conditional_coverage').find(
      (one) => one.name === name,
    );
    const hits = Uint8Array.from(sequence?.hits ?? '', Number);
    // Logarithms of gamma functions near 1000 leave about 13 digits.
    expect(relativeError(exactIndependenceP(5, 250, transitionsOf(hits)) ?? 0, p)).toBeLessThan(1e-11);
  });

  test('nothing to test without an exceedance, or with nothing else', () => {
    expect(exactIndependenceP(0, 4, transitionsOf(Uint8Array.of(0, 0, 0, 0)))).toBeNull();
    expect(exactIndependenceP(4, 4, transitionsOf(Uint8Array.of(1, 1, 1, 1)))).toBeNull();
  });

  test('one exceedance among four days: two of the four places have each ratio', () => {
    // By hand: first and last place give ratio 0; the two in the middle give 2·(2·ln 2 − ln 3 ... ) > 0, so p = 2/4.
    const middle = transitionsOf(Uint8Array.of(0, 1, 0, 0));
    expect(relativeError(exactIndependenceP(1, 4, middle) ?? 0, 0.5)).toBeLessThan(1e-12);
    const atTheEnd = transitionsOf(Uint8Array.of(0, 0, 0, 1));
    expect(relativeError(exactIndependenceP(1, 4, atTheEnd) ?? 0, 1)).toBeLessThan(1e-12);
  });
});

test('more exceedances than quiet days: three among five lie in three runs in one of ten ways', () => {
  // By hand: of the 10 placements of 3 in 5 days only E·E·E has three runs; 6 have two, 3 have one.
  const shareOf = (runs: number) =>
    arrangementClasses(3, 5)
      .filter(({ transitions }) => 3 - transitions.n11 === runs)
      .reduce((sum, { share }) => sum + share, 0);
  expect(shareOf(3)).toBeCloseTo(0.1, 12);
  expect(shareOf(2)).toBeCloseTo(0.6, 12);
  expect(shareOf(1)).toBeCloseTo(0.3, 12);
});
