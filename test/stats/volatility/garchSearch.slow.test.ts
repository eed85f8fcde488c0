import { expect, test } from 'vitest';
import { standardise } from '../../../src/stats/moments/standardSample.ts';
import { maximiseByNewton } from '../../../src/stats/numerics/boundedNewton.ts';
import { garchObjective } from '../../../src/stats/volatility/internal/garchDerivatives.ts';
import { parameter } from '../../../src/stats/volatility/internal/garchLikelihood.ts';
import { pointOf, searchGarch } from '../../../src/stats/volatility/internal/garchSearch.ts';
import { simulateGarchReturns } from './simulateReturns.ts';

const settings = {
  lower: pointOf(Number.NEGATIVE_INFINITY, Math.log(1e-9), 0, 0, 0),
  upper: pointOf(Number.POSITIVE_INFINITY, Math.log(1e3), 1, 1, 0.4999),
  tolerance: 1e-8,
  maxSteps: 100,
};

/** The highest point with clustering (α above 0, α + β below 0.9999) that any of 24 starts reaches. */
const highestFromManyStarts = (returns: Float64Array): number => {
  const objective = garchObjective(returns);
  let highest = Number.NEGATIVE_INFINITY;
  for (const alpha of [0.005, 0.03, 0.15]) {
    for (const beta of [0, 0.2, 0.45, 0.7, 0.85, 0.94, 0.97, 0.99]) {
      if (alpha + beta >= 1) continue;
      const climb = maximiseByNewton(
        (point, gradient, hessian) =>
          (point[parameter.alpha] as number) + (point[parameter.beta] as number) > 1.2
            ? Number.NEGATIVE_INFINITY
            : objective(point, gradient, hessian),
        pointOf(0, Math.log(1 - alpha - beta), alpha, beta, 0.1),
        settings,
      );
      const [, , reachedAlpha = 0, reachedBeta = 0] = climb.point;
      if (climb.converged && reachedAlpha > 0 && reachedAlpha + reachedBeta < 0.9999)
        highest = Math.max(highest, climb.value);
    }
  }
  return highest;
};

// Two climbs to the same summit differ by rounding of 500 to 1,000 terms.
test.each([
  ['clustered, fat tails', 500, 0.08, 0.9, 5],
  ['clustered, long memory', 1000, 0.03, 0.96, 8],
  ['clustered, short memory', 500, 0.2, 0.4, 6],
  ['no clustering, fat tails', 500, 0, 0, 4],
  ['no clustering, normal', 500, 0, 0, Number.POSITIVE_INFINITY],
] as const)('no start of a dense grid ends higher: %s', (_, count, alpha, beta, nu) => {
  const process = { mu: 0, omega: 1e-4 * (1 - alpha - beta), alpha, beta };
  for (let replicate = 0; replicate < 30; replicate += 1) {
    const { values } = standardise(simulateGarchReturns(count, process, nu, 7000 + replicate));
    const { clustered, constant } = searchGarch(values, 'student');
    const found = Math.max(clustered.value, constant.value);
    expect(highestFromManyStarts(values)).toBeLessThan(found + 1e-6);
  }
});
