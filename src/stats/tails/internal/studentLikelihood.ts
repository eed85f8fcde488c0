import { fillStudentNormaliser } from '../../distributions/studentNormaliser.ts';
import type { SmoothObjective } from '../../numerics/boundedNewton.ts';
import type { SmoothValue } from '../../numerics/smoothValue.ts';
import { fillTailSeries, type TailSeries } from './studentTailSeries.ts';

/** Largest product kept before its logarithm is taken: one further factor must not overflow. */
const largestProduct = 1e150;

/** 1/nu below which Σ ln(1 + u²/nu) divided by powers of 1/nu would lose digits, and a series per return takes over. */
const directFrom = 1e-4;

/** Sums over the returns of u = (value − location)/scale and A = 1 + u²/nu, by which all derivatives are written. */
export type StudentSums = {
  logA: number;
  uOverA: number;
  squareOverA: number;
  oneOverA: number;
  oneOverAA: number;
  uOverAA: number;
  squareOverAA: number;
  cubeOverAA: number;
  fourthOverAA: number;
};

const fillSums = (
  values: Float64Array,
  location: number,
  scale: number,
  inverseNu: number,
  into: StudentSums,
): void => {
  let logA = 0;
  let product = 1;
  let uOverA = 0;
  let squareOverA = 0;
  let oneOverA = 0;
  let oneOverAA = 0;
  let uOverAA = 0;
  let squareOverAA = 0;
  let cubeOverAA = 0;
  let fourthOverAA = 0;
  const inverseScale = 1 / scale;
  const count = values.length;
  for (let index = 0; index < count; index += 1) {
    const u = ((values[index] as number) - location) * inverseScale;
    const square = u * u;
    const a = 1 + inverseNu * square;
    product *= a;
    if (product > largestProduct) {
      logA += Math.log(product);
      product = 1;
    }
    const inverse = 1 / a;
    const inverseSquare = inverse * inverse;
    const squareShare = square * inverseSquare;
    oneOverA += inverse;
    uOverA += u * inverse;
    squareOverA += square * inverse;
    oneOverAA += inverseSquare;
    uOverAA += u * inverseSquare;
    squareOverAA += squareShare;
    cubeOverAA += u * squareShare;
    fourthOverAA += square * squareShare;
  }
  into.logA = logA + Math.log(product);
  into.uOverA = uOverA;
  into.squareOverA = squareOverA;
  into.oneOverA = oneOverA;
  into.oneOverAA = oneOverAA;
  into.uOverAA = uOverAA;
  into.squareOverAA = squareOverAA;
  into.cubeOverAA = cubeOverAA;
  into.fourthOverAA = fourthOverAA;
};

/**
 * The log-likelihood of returns under location + scale·t(nu), in the parameters (location, ln scale, 1/nu), with its
 * gradient and second derivatives. Holds its own workspace: one instance serves one sample, one call at a time.
 */
export type StudentLikelihood = {
  readonly count: number;
  readonly objective: SmoothObjective;
  /** The sums of the last evaluation, for the steps of the expectation-maximisation algorithm. */
  readonly sums: StudentSums;
};

const emptySums = (): StudentSums => ({
  logA: 0,
  uOverA: 0,
  squareOverA: 0,
  oneOverA: 0,
  oneOverAA: 0,
  uOverAA: 0,
  squareOverAA: 0,
  cubeOverAA: 0,
  fourthOverAA: 0,
});

/** The three sums in 1/nu: Σ ln(A)/inverseNu and what its derivatives leave, free of cancellation. */
const fillTail = (
  values: Float64Array,
  point: Float64Array,
  scale: number,
  sums: StudentSums,
  into: TailSeries,
): void => {
  const inverseNu = point[2] as number;
  if (inverseNu < directFrom) {
    fillTailSeries(values, point[0] as number, scale, inverseNu, into);
    return;
  }
  const fourth = (sums.logA / inverseNu - sums.squareOverA) / inverseNu;
  into.square = sums.logA / inverseNu;
  into.fourth = fourth;
  into.sixth = (sums.fourthOverAA - 2 * fourth) / inverseNu;
};

const fillGradient = (
  count: number,
  scale: number,
  inverseNu: number,
  sums: StudentSums,
  tail: TailSeries,
  normaliser: SmoothValue,
  gradient: Float64Array,
): void => {
  const weight = 1 + inverseNu;
  gradient[0] = (weight / scale) * sums.uOverA;
  gradient[1] = weight * sums.squareOverA - count;
  gradient[2] = count * normaliser.slope + 0.5 * (tail.fourth - sums.squareOverA);
};

const fillHessian = (
  count: number,
  scale: number,
  inverseNu: number,
  sums: StudentSums,
  tail: TailSeries,
  normaliser: SmoothValue,
  hessian: Float64Array,
): void => {
  const weight = 1 + inverseNu;
  const locationScale = (-2 * weight * sums.uOverAA) / scale;
  const locationNu = (sums.uOverAA - sums.cubeOverAA) / scale;
  const scaleNu = sums.squareOverAA - sums.fourthOverAA;
  hessian[0] = (-weight * (2 * sums.oneOverAA - sums.oneOverA)) / (scale * scale);
  hessian[1] = locationScale;
  hessian[2] = locationNu;
  hessian[3] = locationScale;
  hessian[4] = -2 * weight * sums.squareOverAA;
  hessian[5] = scaleNu;
  hessian[6] = locationNu;
  hessian[7] = scaleNu;
  hessian[8] = count * normaliser.curvature + 0.5 * (tail.sixth + sums.fourthOverAA);
};

export const studentLikelihood = (values: Float64Array): StudentLikelihood => {
  const count = values.length;
  const sums = emptySums();
  const tail: TailSeries = { square: 0, fourth: 0, sixth: 0 };
  const normaliser: SmoothValue = { value: 0, slope: 0, curvature: 0 };
  const objective: SmoothObjective = (point, gradient, hessian) => {
    const logScale = point[1] as number;
    const inverseNu = point[2] as number;
    const scale = Math.exp(logScale);
    fillSums(values, point[0] as number, scale, inverseNu, sums);
    fillTail(values, point, scale, sums, tail);
    fillStudentNormaliser(inverseNu, normaliser);
    fillGradient(count, scale, inverseNu, sums, tail, normaliser, gradient);
    fillHessian(count, scale, inverseNu, sums, tail, normaliser, hessian);
    const value = count * (normaliser.value - logScale) - 0.5 * (1 + inverseNu) * tail.square;
    return Number.isFinite(value) ? value : Number.NEGATIVE_INFINITY;
  };
  return { count, objective, sums };
};
