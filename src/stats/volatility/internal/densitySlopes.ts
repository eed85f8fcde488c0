import type { SmoothValue } from '../../numerics/smoothValue.ts';
import { sumOfLogarithms } from '../../numerics/sumOfLogarithms.ts';
import { innovationTerms, term } from './studentInnovation.ts';
import type { VariancePath } from './variancePath.ts';

/**
 * Below this 1/nu the sums in 1/nu are taken day by day from series. From here up they come from the logarithm of products over
 * several days, which is several times as fast and leaves them an error near 1e-14·nu².
 */
const productsFrom = 0.01;

/** Writes the seven slopes of the log-density of one day from A's slopes in q, in q twice, and in q and 1/nu. */
const writeDay = (
  path: VariancePath,
  day: number,
  inverseH: number,
  aQ: number,
  aQQ: number,
  aQNu: number,
): void => {
  const q = (path.squared[day] as number) * inverseH;
  const slope = (path.squaredSlope[day] as number) * inverseH;
  path.inH[day] = (aQ * q - 0.5) * inverseH;
  path.inHH[day] = (0.5 - q * (2 * aQ + q * aQQ)) * inverseH * inverseH;
  path.inHE[day] = -slope * (aQ + q * aQQ) * inverseH;
  path.inHNu[day] = aQNu * q * inverseH;
  path.inE[day] = aQ * slope;
  path.inEE[day] = -2 * inverseH * (aQ + 2 * q * aQQ);
  path.inENu[day] = aQNu * slope;
};

const writeFromSeries = (path: VariancePath, inverseNu: number): SmoothValue => {
  const { h, squared } = path;
  const terms = new Float64Array(6);
  const sums = { value: 0, slope: 0, curvature: 0 };
  for (let day = 1; day < h.length; day += 1) {
    const inverseH = 1 / (h[day] as number);
    innovationTerms((squared[day] as number) * inverseH, inverseNu, terms);
    const [aQ, aQQ, aQNu] = [terms[term.q], terms[term.qq], terms[term.qInverseNu]];
    writeDay(path, day, inverseH, aQ as number, aQQ as number, aQNu as number);
    sums.value += terms[term.value] as number;
    sums.slope += terms[term.inverseNu] as number;
    sums.curvature += terms[term.inverseNuTwice] as number;
  }
  return sums;
};

/**
 * With w = q/(1 − 2λ), x = λw and p = 1/(1 + x): A = ((1 + λ)/(2λ))·ln(1 + x), and the sums over the days of ln(1 + x), xp,
 * (xp)² and wp²(4 + 2x − q) give A's slopes in λ, which `innovationTerms` gives for one day.
 */
const writeFromProducts = (path: VariancePath, inverseNu: number): SmoothValue => {
  const { h, squared, factor } = path;
  const perRest = 1 / (1 - 2 * inverseNu);
  const half = ((1 + inverseNu) * perRest) / 2;
  let shares = 0;
  let squares = 0;
  let remainders = 0;
  for (let day = 1; day < h.length; day += 1) {
    const inverseH = 1 / (h[day] as number);
    const q = (squared[day] as number) * inverseH;
    const w = q * perRest;
    const x = inverseNu * w;
    const p = 1 / (1 + x);
    const share = x * p;
    const aQ = half * p;
    factor[day] = 1 + x;
    writeDay(path, day, inverseH, aQ, -aQ * p * inverseNu * perRest, (1.5 * perRest - aQ * w) * p * perRest);
    shares += share;
    squares += share * share;
    remainders += w * p * p * (4 + 2 * x - q);
  }
  const logarithms = sumOfLogarithms(factor, 1);
  const bend = (shares - logarithms) / inverseNu ** 2;
  const bendSlope = -(squares + 2 * (shares - logarithms)) / inverseNu ** 3;
  return {
    value: ((1 + inverseNu) / (2 * inverseNu)) * logarithms,
    slope: bend / 2 + (1.5 * shares * perRest) / inverseNu,
    curvature: ((4 * bend + bendSlope) * perRest) / 2 + 1.5 * remainders * perRest ** 2,
  };
};

/**
 * Writes the slopes of every day's log-density, and returns Σ A(q, λ), the part of the loss −ln density that is not
 * ½·ln h, with its first two derivatives in λ = 1/nu.
 */
export const writeDensitySlopes = (path: VariancePath, inverseNu: number): SmoothValue =>
  inverseNu < productsFrom ? writeFromSeries(path, inverseNu) : writeFromProducts(path, inverseNu);
