import { describe, expect, test } from 'vitest';
import {
  logarithmCurvature,
  logarithmCurvatureSlope,
} from '../../../src/stats/numerics/logarithmCurvature.ts';
import { relativeError } from '../../laws/relativeError.ts';

// mpmath 1.3.0 at 50 digits: (x/(1+x) - log(1+x))/x**2 and its derivative in closed form.
const expected = [
  [-0.9, -8.268413465439451, 92.73685896569016],
  [-0.2, -0.6714112171447562, 1.0983878285524389],
  [-0.050001, -0.5353145720399015, 0.7481136301807961],
  [-0.049999, -0.5353130758161758, 0.7481100955419394],
  [-1e-9, -0.5000000006666667, 0.6666666681666666],
  [0, -0.5, 0.6666666666666666],
  [1e-5, -0.4999933334083325, 0.6666516669066633],
  [0.049999, -0.4684472174296321, 0.5972765200013829],
  [0.050001, -0.4684460228791581, 0.5972739539808267],
  [3, -0.07069937345776563, 0.026299582305177083],
  [1000, -5.9097537803142215e-6, 1.0821504564623449e-8],
] as const;

describe('what is left of the slope of ln(1 + ax)/a', () => {
  test.each(expected)('at x = %s', (x, curvature, slope) => {
    const found = logarithmCurvature(x, Math.log1p(x));
    // Where the closed form takes over, a rounding error of 0.05 is divided by x²/2 once and by x³ twice.
    expect(relativeError(found, curvature)).toBeLessThan(2e-14);
    expect(relativeError(logarithmCurvatureSlope(x, found), slope)).toBeLessThan(2e-12);
  });
});
