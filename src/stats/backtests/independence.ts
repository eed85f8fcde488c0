import { chiSquareUpperTail } from '../distributions/chiSquare.ts';
import type { LikelihoodRatio } from './coverage.ts';
import type { Transitions } from './transitions.ts';

/** n·ln(n/of), with 0·ln 0 = 0. */
const logLikelihood = (count: number, of: number): number => (count === 0 ? 0 : count * Math.log(count / of));

/** The statistic of {@link independenceTest} alone: twice the gain in log-likelihood of a chain over constant chances. */
export const independenceRatio = ({ n00, n01, n10, n11 }: Transitions): number => {
  const fromQuiet = n00 + n01;
  const fromHit = n10 + n11;
  const pairs = fromQuiet + fromHit;
  const chain =
    logLikelihood(n00, fromQuiet) +
    logLikelihood(n01, fromQuiet) +
    logLikelihood(n10, fromHit) +
    logLikelihood(n11, fromHit);
  const constant = logLikelihood(n00 + n10, pairs) + logLikelihood(n01 + n11, pairs);
  return Math.max(0, 2 * (chain - constant));
};

/**
 * Does an exceedance come more (or less) easily after an exceedance?
 *
 * Convention: first-order Markov chain against constant chances over the T − 1 day pairs; chi-square, one degree of freedom.
 * Domain: any counts of pairs.
 * Units: counts in; the statistic and an upper tail probability out.
 * Edges: 0·ln 0 = 0, so without exceedances, or with nothing else, the ratio is 0 and p = 1: nothing was tested.
 * Source: Christoffersen 1998, International Economic Review 39, 841-862, section 3.2.
 * Example: five exceedances in a row within 250 days (n00 243, n01 1, n10 1, n11 4) give 30.98.
 */
export const independenceTest = (transitions: Transitions): LikelihoodRatio => {
  const likelihoodRatio = independenceRatio(transitions);
  return { likelihoodRatio, p: chiSquareUpperTail(likelihoodRatio, 1) };
};

/**
 * Do the exceedances come in the right number and without pattern?
 *
 * Convention: the coverage ratio over all T days plus the independence ratio over the T − 1 pairs; chi-square, two degrees
 * of freedom. (Conditioning the coverage part on the first day as well changes the third digit at most in usual cases.)
 * Domain: two ratios ≥ 0.
 * Units: statistics in; their sum and an upper tail probability out.
 * Edges: as for the two parts.
 * Source: Christoffersen 1998, International Economic Review 39, section 3.3.
 * Example: 1.9568 and 30.9848 give 32.9416 and p = 7.03e-8.
 */
export const conditionalCoverageTest = (
  coverage: LikelihoodRatio,
  independence: LikelihoodRatio,
): LikelihoodRatio => {
  const likelihoodRatio = coverage.likelihoodRatio + independence.likelihoodRatio;
  return { likelihoodRatio, p: chiSquareUpperTail(likelihoodRatio, 2) };
};
