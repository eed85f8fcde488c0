import { parameter } from './garchLikelihood.ts';

/**
 * What an evaluation knows of each day, one array for each number. Place 0 is the day before the first, place t the day of
 * returns[t − 1]. The arrays serve every evaluation of a climb.
 */
export type VariancePath = {
  /** The variance, with its slopes in mu, ln ω, α and β. */
  readonly h: Float64Array;
  readonly hMu: Float64Array;
  readonly hOmega: Float64Array;
  readonly hAlpha: Float64Array;
  readonly hBeta: Float64Array;
  /** e² and its slope in mu, −2e. */
  readonly squared: Float64Array;
  readonly squaredSlope: Float64Array;
  /** Slopes of the day's log-density in h and in e, once and twice, and in each of them and 1/nu. */
  readonly inH: Float64Array;
  readonly inHH: Float64Array;
  readonly inHE: Float64Array;
  readonly inHNu: Float64Array;
  readonly inE: Float64Array;
  readonly inEE: Float64Array;
  readonly inENu: Float64Array;
  /** 1 + λq/(1 − 2λ), λ = 1/nu and q = e²/h. */
  readonly factor: Float64Array;
};

export const createPath = (count: number): VariancePath => {
  const column = () => new Float64Array(count + 1);
  return {
    h: column(),
    hMu: column(),
    hOmega: column(),
    hAlpha: column(),
    hBeta: column(),
    squared: column(),
    squaredSlope: column(),
    inH: column(),
    inHH: column(),
    inHE: column(),
    inHNu: column(),
    inE: column(),
    inEE: column(),
    inENu: column(),
    factor: column(),
  };
};

/** e² and −2e of every day; before the first the mean of each, which is the variance S there and its slope in mu. */
const writeSquares = (returns: Float64Array, mu: number, { squared, squaredSlope }: VariancePath): void => {
  let sum = 0;
  let slopes = 0;
  for (let day = 1; day < squared.length; day += 1) {
    const e = (returns[day - 1] as number) - mu;
    squared[day] = e * e;
    squaredSlope[day] = -2 * e;
    sum += e * e;
    slopes -= 2 * e;
  }
  squared[0] = sum / returns.length;
  squaredSlope[0] = slopes / returns.length;
};

/** Writes the variance h' = ω + α·e² + β·h of every day with its slopes, and the squared residuals. */
export const writeVariancePath = (returns: Float64Array, point: Float64Array, path: VariancePath): void => {
  const omega = Math.exp(point[parameter.logOmega] as number);
  const alpha = point[parameter.alpha] as number;
  const beta = point[parameter.beta] as number;
  writeSquares(returns, point[parameter.mu] as number, path);
  const { h, hMu, hOmega, hAlpha, hBeta, squared, squaredSlope } = path;
  let variance = squared[0] as number;
  let mu = squaredSlope[0] as number;
  h[0] = variance;
  hMu[0] = mu;
  let logOmega = 0;
  let inAlpha = 0;
  let inBeta = 0;
  for (let day = 1; day < h.length; day += 1) {
    const before = squared[day - 1] as number;
    mu = alpha * (squaredSlope[day - 1] as number) + beta * mu;
    logOmega = omega + beta * logOmega;
    inAlpha = before + beta * inAlpha;
    inBeta = variance + beta * inBeta;
    variance = omega + alpha * before + beta * variance;
    h[day] = variance;
    hMu[day] = mu;
    hOmega[day] = logOmega;
    hAlpha[day] = inAlpha;
    hBeta[day] = inBeta;
  }
};
