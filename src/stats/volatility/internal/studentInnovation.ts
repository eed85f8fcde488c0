import { logarithmCurvature, logarithmCurvatureSlope } from '../../numerics/logarithmCurvature.ts';

/**
 * The part of a unit-variance Student log-density that depends on the data, A(q, λ) = ((1 + λ)/(2λ))·ln(1 + λq/(1 − 2λ)),
 * with q = e²/h and λ = 1/nu in [0, ½), and its derivatives. The log-density is c(λ) − ½·ln h − A. Written so that nothing
 * cancels as λ → 0, where A → q/2, the normal density.
 */

/** A(q, λ) alone, for searches that need no slope. */
export const innovationLoss = (q: number, inverseNu: number): number => {
  const w = q / (1 - 2 * inverseNu);
  const x = inverseNu * w;
  return ((1 + inverseNu) / 2) * (x < 1e-17 ? w : Math.log1p(x) / inverseNu);
};

/** Where each derivative stands in the array that `innovationTerms` fills. */
export const term = { value: 0, q: 1, qq: 2, inverseNu: 3, qInverseNu: 4, inverseNuTwice: 5 } as const;

/** A and its five derivatives, written into `out` (six places), because a fit asks for them a million times. */
export const innovationTerms = (q: number, inverseNu: number, out: Float64Array): void => {
  const rest = 1 - 2 * inverseNu;
  const w = q / rest;
  const x = inverseNu * w;
  const onePlus = 1 + x;
  const slopeFactor = (1 + inverseNu) / rest;
  const logarithm = Math.log1p(x);
  const bend = logarithmCurvature(x, logarithm);
  out[term.value] = ((1 + inverseNu) / 2) * (x < 1e-17 ? w : logarithm / inverseNu);
  out[term.q] = slopeFactor / (2 * onePlus);
  out[term.qq] = (-slopeFactor * inverseNu) / (2 * rest * onePlus * onePlus);
  out[term.inverseNu] = (w * w * bend) / 2 + (1.5 * w) / (rest * onePlus);
  out[term.qInverseNu] = (3 / (rest * rest) - (slopeFactor * w) / (rest * onePlus)) / (2 * onePlus);
  const remainderSlope = (w * (4 + 2 * x - w * rest)) / (rest * rest * onePlus * onePlus);
  out[term.inverseNuTwice] =
    (w * w * (4 * bend + w * logarithmCurvatureSlope(x, bend))) / (2 * rest) + 1.5 * remainderSlope;
};
