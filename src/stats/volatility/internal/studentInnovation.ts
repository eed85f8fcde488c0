/**
 * The part of a unit-variance Student log-density that depends on the data, A(q, λ) = ((1 + λ)/(2λ))·ln(1 + λq/(1 − 2λ)),
 * with q = e²/h and λ = 1/nu in [0, ½), and its derivatives. The log-density is c(λ) − ½·ln h − A. Written so that nothing
 * cancels as λ → 0, where A → q/2, the normal density.
 */

/** Below this argument the closed forms of G and G' lose digits and the series is shorter than a logarithm. */
const seriesLimit = 0.05;

// Coefficients of G(x) = Σ_{m≥2} (−1)^{m+1}·((m − 1)/m)·x^{m−2}; fifteen of them reach 1e-17 at the limit.
const seriesCoefficients = Array.from(
  { length: 15 },
  (_, index) => ((index % 2 === 0 ? -1 : 1) * (index + 1)) / (index + 2),
);

/** G(x) = [x/(1 + x) − ln(1 + x)]/x², the curvature left of the logarithm once its slope is taken out. */
const curvature = (x: number, logarithm: number): number => {
  if (x >= seriesLimit) return (x / (1 + x) - logarithm) / (x * x);
  let sum = 0;
  for (let index = seriesCoefficients.length - 1; index >= 0; index -= 1) {
    sum = sum * x + (seriesCoefficients[index] as number);
  }
  return sum;
};

/** G'(x); `curvatureAtX` is G(x), known to the caller already. */
const curvatureSlope = (x: number, curvatureAtX: number): number => {
  if (x >= seriesLimit) return -(1 / ((1 + x) * (1 + x)) + 2 * curvatureAtX) / x;
  let sum = 0;
  for (let index = seriesCoefficients.length - 1; index >= 1; index -= 1) {
    sum = sum * x + index * (seriesCoefficients[index] as number);
  }
  return sum;
};

/** A(q, λ) alone, for searches that need no slope. */
export const innovationLoss = (q: number, inverseNu: number): number => {
  const w = q / (1 - 2 * inverseNu);
  const x = inverseNu * w;
  return ((1 + inverseNu) / 2) * (x === 0 ? w : Math.log1p(x) / inverseNu);
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
  const bend = curvature(x, logarithm);
  out[term.value] = ((1 + inverseNu) / 2) * (x === 0 ? w : logarithm / inverseNu);
  out[term.q] = slopeFactor / (2 * onePlus);
  out[term.qq] = (-slopeFactor * inverseNu) / (2 * rest * onePlus * onePlus);
  out[term.inverseNu] = (w * w * bend) / 2 + (1.5 * w) / (rest * onePlus);
  out[term.qInverseNu] = (3 / (rest * rest) - (slopeFactor * w) / (rest * onePlus)) / (2 * onePlus);
  const remainderSlope = (w * (4 + 2 * x - w * rest)) / (rest * rest * onePlus * onePlus);
  out[term.inverseNuTwice] =
    (w * w * (4 * bend + w * curvatureSlope(x, bend))) / (2 * rest) + 1.5 * remainderSlope;
};
