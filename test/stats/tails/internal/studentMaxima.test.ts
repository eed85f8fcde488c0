import { describe, expect, it } from 'vitest';
import { standardise } from '../../../../src/stats/moments/standardSample.ts';
import { nextNormal, nextOpenDouble } from '../../../../src/stats/random/draws.ts';
import { climbAtFixedNu } from '../../../../src/stats/tails/internal/fixedNu.ts';
import { studentLikelihood } from '../../../../src/stats/tails/internal/studentLikelihood.ts';
import { studentMaxima } from '../../../../src/stats/tails/internal/studentMaxima.ts';
import { testStreams } from '../../testStreams.ts';

const maximaOf = (values: Float64Array) => {
  const sample = standardise(values);
  return studentMaxima(studentLikelihood(sample.values), sample);
};

describe('The maxima along 1/nu', () => {
  it('holds both of a sample whose second one hides between two points of the grid', () => {
    // A cluster near 1.6 among normal numbers, found by a search along 200 values of 1/nu: maxima near 0.08 and 1.59.
    const hiding = Float64Array.of(
      ...[-0.403, 1.642, -0.041, 1.693, -0.156, 0.13, 1.583, 0.075, 1.597, 0.055, 1.546, -0.331, -2.626],
      ...[1.806, 1.091, -0.464, 1.503, 1.47, 1.667, -0.27, 1.671, 2.214, 1.48, -2.31, 3.064],
    );
    const found = maximaOf(hiding).map(({ point }) => point[2] as number);
    expect(found.length).toBe(2);
    expect(Math.abs((found[0] ?? 0) - 0.08)).toBeLessThan(0.01);
    expect(Math.abs((found[1] ?? 0) - 1.59)).toBeLessThan(0.01);
  });

  it('is not beaten along 100 values of 1/nu on samples with clusters and outliers', () => {
    const random = testStreams(11).stream(0);
    for (let round = 0; round < 60; round += 1) {
      const share = 0.1 + 0.35 * nextOpenDouble(random);
      const tight = 10 ** (-3 * nextOpenDouble(random));
      const wide = 10 ** (1.5 * nextOpenDouble(random));
      const values = Float64Array.from({ length: 20 + (round % 5) * 10 }, () => {
        const kind = nextOpenDouble(random);
        return (kind < share ? tight : kind < share + 0.15 ? wide : 1) * nextNormal(random);
      });
      const maxima = maximaOf(values);
      expect(maxima.every(({ converged }) => converged)).toBe(true);
      const highest = Math.max(...maxima.map(({ value }) => value));
      const likelihood = studentLikelihood(standardise(values).values);
      let place = { location: 0, logScale: 0 };
      for (let step = 1; step <= 100; step += 1) {
        const reached = climbAtFixedNu(likelihood, step / 50, place, 1e-5);
        expect(reached.value).toBeLessThan(highest + 1e-7);
        place = reached;
      }
    }
  });
});
