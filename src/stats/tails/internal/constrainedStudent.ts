import { maximiseByNewton, type SmoothObjective } from '../../numerics/boundedNewton.ts';
import type { StudentLikelihood } from './studentLikelihood.ts';
import type { StudentPlace, TailCoordinates } from './tailCoordinates.ts';

/** The highest point under a constraint, with the gradient in (location, ln scale, 1/nu) there. */
export type ConstrainedPoint = StudentPlace & { readonly value: number; readonly gradient: Float64Array };

const tolerance = 1e-7;
const maxSteps = 100;

/** Σ over parameters of first derivative times the row's own, plus slope times second derivative: one entry of the chain rule. */
const chainEntry = (
  hessian: Float64Array,
  gradient: Float64Array,
  first: Float64Array,
  second: Float64Array,
  row: number,
  column: number,
): number => {
  let sum = 0;
  for (let a = 0; a < 3; a += 1) {
    sum += (gradient[a] as number) * (second[3 * a + row + column] as number);
    const left = first[2 * a + row] as number;
    if (left === 0) continue;
    for (let b = 0; b < 3; b += 1)
      sum += left * (hessian[3 * a + b] as number) * (first[2 * b + column] as number);
  }
  return sum;
};

type Parts = { readonly parameters: Float64Array; readonly gradient: Float64Array };

/** The log-likelihood in the two coordinates, its derivatives by the chain rule; leaves the parameters in `parts`. */
const inCoordinates = (
  likelihood: StudentLikelihood,
  coordinates: TailCoordinates,
  parts: Parts,
): SmoothObjective => {
  const { parameters, gradient } = parts;
  const hessian = new Float64Array(9);
  const first = new Float64Array(6);
  const second = new Float64Array(9);
  return (point, reducedGradient, reducedHessian) => {
    if (!coordinates.place(point, parameters, first, second)) return Number.NEGATIVE_INFINITY;
    const value = likelihood.objective(parameters, gradient, hessian);
    for (let i = 0; i < 2; i += 1) {
      let sum = 0;
      for (let a = 0; a < 3; a += 1) sum += (gradient[a] as number) * (first[2 * a + i] as number);
      reducedGradient[i] = sum;
    }
    const mixed = chainEntry(hessian, gradient, first, second, 0, 1);
    reducedHessian[0] = chainEntry(hessian, gradient, first, second, 0, 0);
    reducedHessian[1] = mixed;
    reducedHessian[2] = mixed;
    reducedHessian[3] = chainEntry(hessian, gradient, first, second, 1, 1);
    return value;
  };
};

/** Climbs under the constraint from the distribution nearest to `start`; null where the climb does not reach its rule. */
export const maximiseUnder = (
  likelihood: StudentLikelihood,
  coordinates: TailCoordinates,
  start: StudentPlace,
): ConstrainedPoint | null => {
  const parts: Parts = { parameters: new Float64Array(3), gradient: new Float64Array(3) };
  const objective = inCoordinates(likelihood, coordinates, parts);
  const { lower, upper } = coordinates;
  const maximum = maximiseByNewton(objective, coordinates.of(start), { lower, upper, tolerance, maxSteps });
  if (!maximum.converged) return null;
  const value = objective(maximum.point, new Float64Array(2), new Float64Array(4));
  return {
    value,
    location: parts.parameters[0] as number,
    logScale: parts.parameters[1] as number,
    inverseNu: parts.parameters[2] as number,
    gradient: parts.gradient,
  };
};
