import { expect, it } from 'vitest';
import { betaCdf, betaQuantile, betaUpperTail } from '../../../src/stats/distributions/beta.ts';
import { binomialCdf, binomialMass, binomialUpperTail } from '../../../src/stats/distributions/binomial.ts';
import {
  chiSquareCdf,
  chiSquareQuantile,
  chiSquareUpperQuantile,
  chiSquareUpperTail,
} from '../../../src/stats/distributions/chiSquare.ts';
import {
  digamma,
  logGamma,
  logGammaDifference,
  trigamma,
} from '../../../src/stats/distributions/gammaFunctions.ts';
import {
  noncentralityAt,
  noncentralTCdf,
  noncentralTQuantile,
  noncentralTUpperTail,
} from '../../../src/stats/distributions/noncentralT.ts';
import {
  normalCdf,
  normalDensity,
  normalQuantile,
  normalUpperTail,
} from '../../../src/stats/distributions/normal.ts';
import {
  studentTCdf,
  studentTDensity,
  studentTQuantile,
  studentTTwoSidedTail,
  studentTUpperTail,
} from '../../../src/stats/distributions/studentT.ts';
import { relativeError } from '../../laws/relativeError.ts';

// The examples of the doc blocks. Where they are not exact by hand they are SciPy 1.17.1's (norm, t, chi2, beta, nct), to the
// 15 digits shown; 1e-13 leaves room for the last of them and for the inputs' own rounding.
it.each([
  ['normalDensity', normalDensity(0), 0.398942280401433],
  ['normalUpperTail', normalUpperTail(1.96), 0.0249978951482204],
  ['normalCdf', normalCdf(-1.96), 0.0249978951482204],
  ['normalQuantile', normalQuantile(0.975), 1.95996398454005],
  ['studentTDensity', studentTDensity(0, 4), 0.375],
  ['studentTTwoSidedTail', studentTTwoSidedTail(2.09302405440831, 19), 0.05],
  ['studentTUpperTail', studentTUpperTail(1, 1), 0.25],
  ['studentTCdf', studentTCdf(-1, 1), 0.25],
  ['studentTQuantile', studentTQuantile(0.975, 19), 2.09302405440831],
  ['chiSquareCdf', chiSquareCdf(3.84145882069412, 1), 0.95],
  ['chiSquareUpperTail', chiSquareUpperTail(3.84145882069412, 1), 0.05],
  ['chiSquareQuantile', chiSquareQuantile(0.025, 19), 8.90651648198797],
  ['chiSquareUpperQuantile', chiSquareUpperQuantile(0.05, 1), 3.84145882069412],
  ['betaCdf', betaCdf(0.5, 2, 2), 0.5],
  ['betaUpperTail', betaUpperTail(0.9, 1, 3), 0.001],
  ['betaQuantile', betaQuantile(0.025, 3, 248), 0.00248155825470304],
  ['binomialMass', binomialMass(1, 2, 0.5), 0.5],
  ['binomialCdf', binomialCdf(1, 2, 0.5), 0.75],
  ['binomialUpperTail', binomialUpperTail(1, 2, 0.5), 0.75],
  ['noncentralTUpperTail', noncentralTUpperTail(2, 9, 3), 0.830663895257266],
  ['noncentralTCdf', noncentralTCdf(2, 9, 3), 0.169336104742734],
  ['noncentralTQuantile', noncentralTQuantile(0.9, 5, 2), 4.30128451127761],
  ['noncentralityAt', noncentralityAt(0.025, 2.5, 19), 4.58478959454987],
  ['logGamma', logGamma(5), Math.log(24)],
  ['digamma', digamma(1), -0.577215664901533],
  ['trigamma', trigamma(1), Math.PI ** 2 / 6],
  ['logGammaDifference', logGammaDifference(2).value, Math.log(Math.sqrt(Math.PI) / 2)],
] as const)('%s', (_, figure, expected) => {
  expect(relativeError(figure, expected)).toBeLessThan(1e-13);
});
