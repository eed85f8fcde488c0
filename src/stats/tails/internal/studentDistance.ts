import type { RandomStreams } from '../../../terms/random.ts';
import { maximiseByNewton } from '../../numerics/boundedNewton.ts';
import { nextStudentT } from '../../random/studentDraw.ts';
import { andersonDarling } from '../andersonDarling.ts';
import type { StudentParameters } from '../studentFit.ts';
import { parametricReplicates } from './parametricReplicates.ts';
import { studentLikelihood } from './studentLikelihood.ts';
import { studentSettings } from './studentMaxima.ts';
import { studentTailOfAndersonDarling } from './symmetricTail.ts';

/** A² of values against the Student distribution with the given parameters. */
export const studentDistance = (values: Float64Array, { location, scale, nu }: StudentParameters): number =>
  andersonDarling(values.map((value) => (value - location) / scale).sort(), studentTailOfAndersonDarling(nu));

/** `leftOut`: simulated samples whose fit did not reach its stopping rule. */
export type StudentDistanceProbability = { readonly p: number; readonly leftOut: number };

/**
 * p of A² by parametric bootstrap: (1 + #{simulated ≥ observed})/(B + 1) over samples of the fitted t(nu), each refitted
 * from the true parameters. Location and scale do not matter, for A² of a fitted sample does not feel them.
 */
export const studentDistanceProbability = (
  observed: number,
  count: number,
  nu: number,
  streams: RandomStreams,
): StudentDistanceProbability => {
  const sample = new Float64Array(count);
  const likelihood = studentLikelihood(sample);
  const truth = Float64Array.of(0, 0, 1 / nu);
  let used = 0;
  let further = 0;
  for (let replicate = 0; replicate < parametricReplicates; replicate += 1) {
    const random = streams.stream(replicate);
    for (let draw = 0; draw < count; draw += 1) sample[draw] = nextStudentT(random, nu);
    const refitted = maximiseByNewton(likelihood.objective, truth, studentSettings);
    if (!refitted.converged) continue;
    used += 1;
    const location = refitted.point[0] as number;
    const scale = Math.exp(refitted.point[1] as number);
    const simulated = studentDistance(sample, { location, scale, nu: 1 / (refitted.point[2] as number) });
    if (simulated >= observed) further += 1;
  }
  return { p: (1 + further) / (used + 1), leftOut: parametricReplicates - used };
};
