import type { SmoothObjective } from '../../numerics/boundedNewton.ts';
import { sumOfLogarithms } from '../../numerics/sumOfLogarithms.ts';
import { writeDensitySlopes } from './densitySlopes.ts';
import { parameter, parameterCount } from './garchLikelihood.ts';
import { unitStudentConstant } from './studentConstant.ts';
import { createPath, type VariancePath, writeVariancePath } from './variancePath.ts';

const place = (row: number, column: number): number => row * parameterCount + column;
const { mu: m, logOmega: w, alpha: a, beta: b, inverseNu: v } = parameter;

/**
 * Writes Σ over the days of the density's second slopes times the slopes of h, and what goes through e = r − mu alone.
 * The sums are plain variables: kept in an array they would cost three times as much.
 */
const writeProducts = (path: VariancePath, gradient: Float64Array, hessian: Float64Array): void => {
  const { hMu, hOmega, hAlpha, hBeta, inHH, inHE, inHNu, inE, inEE, inENu } = path;
  let mu = 0;
  let muMu = 0;
  let muOmega = 0;
  let muAlpha = 0;
  let muBeta = 0;
  let muNu = 0;
  let omegaOmega = 0;
  let omegaAlpha = 0;
  let omegaBeta = 0;
  let omegaNu = 0;
  let alphaAlpha = 0;
  let alphaBeta = 0;
  let alphaNu = 0;
  let betaBeta = 0;
  let betaNu = 0;
  for (let day = 1; day < hMu.length; day += 1) {
    const throughMu = hMu[day] as number;
    const throughOmega = hOmega[day] as number;
    const throughAlpha = hAlpha[day] as number;
    const throughBeta = hBeta[day] as number;
    const twice = inHH[day] as number;
    const withE = inHE[day] as number;
    const withNu = inHNu[day] as number;
    const alsoMu = twice * throughMu - withE;
    mu -= inE[day] as number;
    muMu += (alsoMu - withE) * throughMu + (inEE[day] as number);
    muOmega += alsoMu * throughOmega;
    muAlpha += alsoMu * throughAlpha;
    muBeta += alsoMu * throughBeta;
    muNu += withNu * throughMu - (inENu[day] as number);
    omegaOmega += twice * throughOmega * throughOmega;
    omegaAlpha += twice * throughOmega * throughAlpha;
    omegaBeta += twice * throughOmega * throughBeta;
    omegaNu += withNu * throughOmega;
    alphaAlpha += twice * throughAlpha * throughAlpha;
    alphaBeta += twice * throughAlpha * throughBeta;
    alphaNu += withNu * throughAlpha;
    betaBeta += twice * throughBeta * throughBeta;
    betaNu += withNu * throughBeta;
  }
  gradient[m] = mu;
  hessian.set([muMu, muOmega, muAlpha, muBeta, muNu], place(m, m));
  hessian.set([omegaOmega, omegaAlpha, omegaBeta, omegaNu], place(w, w));
  hessian.set([alphaAlpha, alphaBeta, alphaNu], place(a, a));
  hessian.set([betaBeta, betaNu], place(b, b));
};

const add = (sums: Float64Array, index: number, amount: number): void => {
  sums[index] = (sums[index] as number) + amount;
};

/**
 * Adds what goes through the recursion of h. Walked backwards with s_t = ∂ln density/∂h_t + β·s_{t+1}, the slope in h_t of that
 * day and all later ones, Σ_t (∂ln density/∂h_t)·h″_t needs no recursion of h″: each day's own part of h″ counts s_t times.
 */
const addRecursion = (
  path: VariancePath,
  point: Float64Array,
  gradient: Float64Array,
  hessian: Float64Array,
): void => {
  const { h, hMu, hOmega, hAlpha, hBeta, squared, squaredSlope, inH } = path;
  const beta = point[b] as number;
  let slope = 0;
  let sum = 0;
  let mu = 0;
  let alpha = 0;
  let inBeta = 0;
  let muBeta = 0;
  let omegaBeta = 0;
  let alphaBeta = 0;
  let betaBeta = 0;
  for (let before = h.length - 2; before >= 0; before -= 1) {
    slope = (inH[before + 1] as number) + beta * slope;
    sum += slope;
    mu += slope * (squaredSlope[before] as number);
    alpha += slope * (squared[before] as number);
    inBeta += slope * (h[before] as number);
    muBeta += slope * (hMu[before] as number);
    omegaBeta += slope * (hOmega[before] as number);
    alphaBeta += slope * (hAlpha[before] as number);
    betaBeta += slope * (hBeta[before] as number);
  }
  const throughFirst = beta * slope;
  const throughOmega = Math.exp(point[w] as number) * sum;
  add(gradient, m, (point[a] as number) * mu + throughFirst * (squaredSlope[0] as number));
  gradient[w] = throughOmega;
  gradient[a] = alpha;
  gradient[b] = inBeta;
  add(hessian, place(m, m), 2 * ((point[a] as number) * sum + throughFirst));
  add(hessian, place(m, a), mu);
  add(hessian, place(m, b), muBeta);
  add(hessian, place(w, w), throughOmega);
  add(hessian, place(w, b), omegaBeta);
  add(hessian, place(a, b), alphaBeta);
  add(hessian, place(b, b), 2 * betaBeta);
};

const mirror = (hessian: Float64Array): void => {
  for (let row = 1; row < parameterCount; row += 1) {
    for (let column = 0; column < row; column += 1) {
      hessian[place(row, column)] = hessian[place(column, row)] as number;
    }
  }
};

/**
 * The log-likelihood of these returns with its analytic first and second derivatives; −Infinity where the variance
 * overflows. The variance before the first day is the mean squared deviation, S, which moves with mu: S' = −2·mean e, S'' = 2.
 * The arrays are made once, so that an evaluation allocates next to nothing.
 */
export const garchObjective = (returns: Float64Array): SmoothObjective => {
  const path = createPath(returns.length);
  return (point, gradient, hessian) => {
    const inverseNu = point[v] as number;
    writeVariancePath(returns, point, path);
    const loss = writeDensitySlopes(path, inverseNu);
    const constant = unitStudentConstant(inverseNu);
    writeProducts(path, gradient, hessian);
    addRecursion(path, point, gradient, hessian);
    gradient[v] = returns.length * constant.slope - loss.slope;
    hessian[place(v, v)] = returns.length * constant.curvature - loss.curvature;
    mirror(hessian);
    const value = returns.length * constant.value - (sumOfLogarithms(path.h, 1) / 2 + loss.value);
    return Number.isNaN(value) ? -Infinity : value;
  };
};
