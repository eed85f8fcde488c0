import { exponentialGrowth } from '../../../numerics/exponentialGrowth.ts';

/**
 * Figures of a generalised Pareto tail in units of β beyond the threshold, smooth through xi = 0. `depth` is
 * ln(ζ/(1−a)), how far the level lies beyond the threshold; ζ is the share of losses beyond it.
 */

/** Below this ln(1 + x)/x is 1 in a double, and a quotient by a tiny xi would lose it. */
const negligible = 1e-17;

/** (VaR − u)/β = (e^{xi·depth} − 1)/xi. */
export const quantileBeyond = exponentialGrowth;

/** (ES − u)/β = ((VaR − u)/β + 1)/(1 − xi), xi < 1. */
export const shortfallBeyond = (shape: number, depth: number): number =>
  (quantileBeyond(shape, depth) + 1) / (1 - shape);

/** −ln of the chance that an excess is larger than β·distance: ln(1 + xi·distance)/xi; Infinity beyond the end of the tail. */
export const depthAt = (shape: number, distance: number): number => {
  const x = shape * distance;
  if (Math.abs(x) < negligible) return distance;
  return x <= -1 ? Number.POSITIVE_INFINITY : Math.log1p(x) / shape;
};
