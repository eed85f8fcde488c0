/** The lowest point that was found. `converged` is false when the evaluations ran out first. */
export type Minimum = {
  readonly argument: number;
  readonly value: number;
  readonly evaluations: number;
  readonly converged: boolean;
};

export type MinimumOptions = {
  /** Relative accuracy of the argument; below about 1.5e-8 the values themselves no longer tell points apart. */
  readonly relativeTolerance?: number;
  readonly absoluteTolerance?: number;
  readonly maxEvaluations?: number;
};

const goldenShare = (3 - Math.sqrt(5)) / 2;

/**
 * Finds a local minimum of a function of one variable inside an interval.
 *
 * Convention: Brent's method, a parabola through the three best points where it helps, a golden-section step where not.
 * Domain: low < high, both finite; a NaN value counts as +Infinity, so a search may lean on a forbidden region.
 * Unit: argument and value keep theirs.
 * Edges: with several minima one of them is found; a minimum on an end is approached to the tolerance, not reached.
 * Source: Brent 1973, Algorithms for Minimization without Derivatives, chapter 5.
 * Example: `minimiseOnInterval((x) => (x - 2) ** 2, 0, 5).argument` is 2 to about 1e-8.
 */
export const minimiseOnInterval = (
  f: (x: number) => number,
  low: number,
  high: number,
  options: MinimumOptions = {},
): Minimum => {
  const relativeTolerance = options.relativeTolerance ?? 1.5e-8;
  const absoluteTolerance = options.absoluteTolerance ?? 1e-12;
  const maxEvaluations = options.maxEvaluations ?? 200;
  const valueAt = (x: number): number => {
    const value = f(x);
    return Number.isNaN(value) ? Number.POSITIVE_INFINITY : value;
  };
  let left = low;
  let right = high;
  let best = left + goldenShare * (right - left);
  let fBest = valueAt(best);
  let second = best;
  let fSecond = fBest;
  let third = best;
  let fThird = fBest;
  let step = 0;
  let stepBefore = 0;
  for (let evaluations = 1; ; evaluations += 1) {
    const middle = (left + right) / 2;
    const tolerance = relativeTolerance * Math.abs(best) + absoluteTolerance;
    const narrow = Math.abs(best - middle) <= 2 * tolerance - (right - left) / 2;
    if (narrow || evaluations >= maxEvaluations) {
      return { argument: best, value: fBest, evaluations, converged: narrow };
    }
    const parabola = parabolaStep(best, second, third, fBest, fSecond, fThird);
    const usable =
      Math.abs(stepBefore) > tolerance &&
      Math.abs(parabola) < Math.abs(stepBefore / 2) &&
      best + parabola > left &&
      best + parabola < right;
    if (usable) {
      stepBefore = step;
      step = parabola;
      const nearEnd = best + step - left < 2 * tolerance || right - best - step < 2 * tolerance;
      if (nearEnd) step = best < middle ? tolerance : -tolerance;
    } else {
      stepBefore = (best < middle ? right : left) - best;
      step = goldenShare * stepBefore;
    }
    const x = best + (Math.abs(step) >= tolerance ? step : Math.sign(step) * tolerance);
    const fx = valueAt(x);
    if (fx <= fBest) {
      if (x < best) right = best;
      else left = best;
      [third, fThird, second, fSecond, best, fBest] = [second, fSecond, best, fBest, x, fx];
    } else {
      if (x < best) left = x;
      else right = x;
      if (fx <= fSecond || second === best) {
        [third, fThird, second, fSecond] = [second, fSecond, x, fx];
      } else if (fx <= fThird || third === best || third === second) {
        [third, fThird] = [x, fx];
      }
    }
  }
};

/** The step from the best point to the vertex of the parabola through three points; NaN where there is none. */
const parabolaStep = (x: number, w: number, v: number, fx: number, fw: number, fv: number): number => {
  const first = (x - w) * (fx - fv);
  const second = (x - v) * (fx - fw);
  return ((x - w) * first - (x - v) * second) / (-2 * (first - second));
};
