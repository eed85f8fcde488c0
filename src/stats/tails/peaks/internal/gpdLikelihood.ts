import type { SmoothObjective } from '../../../numerics/boundedNewton.ts';
import { logarithmCurvature, logarithmCurvatureSlope } from '../../../numerics/logarithmCurvature.ts';

/**
 * The log-likelihood of excesses under the generalised Pareto distribution, −Σ [ln β + (1 + 1/xi)·ln(1 + xi·y/β)], in the
 * parameters (xi, ln β) with its derivatives, smooth through xi = 0. −Infinity where an excess lies beyond the end of the tail.
 */
export const gpdLogLikelihood =
  (excesses: Float64Array): SmoothObjective =>
  (point, gradient, hessian) => {
    const shape = point[0] as number;
    const logScale = point[1] as number;
    const inverseScale = Math.exp(-logScale);
    let loss = 0;
    let inShape = 0;
    let inScale = 0;
    let twiceShape = 0;
    let mixed = 0;
    let twiceScale = 0;
    for (let index = 0; index < excesses.length; index += 1) {
      const u = (excesses[index] as number) * inverseScale;
      const x = shape * u;
      const onePlus = 1 + x;
      if (!(onePlus > 0)) return Number.NEGATIVE_INFINITY;
      const logarithm = Math.log1p(x);
      const bend = logarithmCurvature(x, logarithm);
      const share = u / onePlus;
      loss += (1 + shape) * (Math.abs(x) < 1e-17 ? u : logarithm / shape);
      inScale += (1 + shape) * share;
      inShape -= u * u * bend + share;
      twiceScale -= ((1 + shape) * share) / onePlus;
      mixed += (share * (1 - u)) / onePlus;
      twiceShape -= u * u * u * logarithmCurvatureSlope(x, bend) - share * share;
    }
    gradient[0] = inShape;
    gradient[1] = inScale - excesses.length;
    hessian[0] = twiceShape;
    hessian[1] = mixed;
    hessian[2] = mixed;
    hessian[3] = twiceScale;
    return -loss - excesses.length * logScale;
  };
