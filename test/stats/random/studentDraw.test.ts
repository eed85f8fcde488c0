import { describe, expect, test } from 'vitest';
import { studentTCdf } from '../../../src/stats/distributions/studentT.ts';
import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { createStreams } from '../../../src/stats/random/xoshiro128.ts';

const draws = 20_000;

/** Largest distance between the empirical and the true distribution function, times √n (Kolmogorov). */
const scaledDistance = (nu: number): number => {
  const random = createStreams(new Uint8Array(32).fill(3)).stream(1);
  const sorted = Float64Array.from({ length: draws }, () => nextStudentT(random, nu)).sort();
  let distance = 0;
  sorted.forEach((value, index) => {
    const expected = studentTCdf(value, nu);
    distance = Math.max(
      distance,
      Math.abs(expected - index / draws),
      Math.abs(expected - (index + 1) / draws),
    );
  });
  return distance * Math.sqrt(draws);
};

describe('a Student number', () => {
  // 1.95 is the 99.9% point of the Kolmogorov distribution (from memory); the seed is fixed, so this never flickers.
  test.each([0.7, 2.5, 5, 40, Number.POSITIVE_INFINITY])(
    'follows the t distribution with %s degrees of freedom',
    (nu) => {
      expect(scaledDistance(nu)).toBeLessThan(1.95);
    },
  );
});
