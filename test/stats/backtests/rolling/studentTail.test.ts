import { describe, expect, test } from 'vitest';
import { drawStudentBeyond } from '../../../../src/stats/backtests/rolling/studentTail.ts';
import { studentTQuantile, studentTUpperTail } from '../../../../src/stats/distributions/studentT.ts';
import { testStreams } from '../../testStreams.ts';

const draws = 20_000;

/**
 * The chances of the draws under the conditional distribution are uniform if and only if the draws follow it. Kolmogorov's
 * distance of 20,000 uniform numbers exceeds 1.95/√20,000 with chance 0.001 (asymptotic formula 2·exp(−2·1.95²)).
 */
const distance = (point: number, nu: number): number => {
  const random = testStreams(64).stream(Math.round(point * 100));
  const beyond = studentTUpperTail(point, nu);
  const shares = Float64Array.from(
    { length: draws },
    () => studentTUpperTail(drawStudentBeyond(point, nu, random), nu) / beyond,
  ).sort();
  return shares.reduce(
    (worst, share, index) => Math.max(worst, (index + 1) / draws - share, share - index / draws),
    0,
  );
};

describe('draws from a Student tail follow the conditional distribution', () => {
  test.each(
    [0.75, 2.5, 4, 30, 1e6, Number.POSITIVE_INFINITY].flatMap((nu) =>
      [0.25, 0.05, 0.001].map((tail) => [nu, tail] as const),
    ),
  )('nu %d, tail %d', (nu, tail) => {
    expect(distance(-studentTQuantile(tail, nu), nu)).toBeLessThan(1.95 / Math.sqrt(draws));
  });
});
