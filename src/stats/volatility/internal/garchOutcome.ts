import { problem } from '../../../terms/problem.ts';
import { type Refusal, refuse } from '../../../terms/result.ts';
import type { NewtonMaximum } from '../../numerics/boundedNewton.ts';
import { parameter } from './garchLikelihood.ts';
import { largestInverseNu } from './garchSearch.ts';

/** From this sum of α and β up the long-run variance is taken not to exist. */
const stationaryBelow = 0.9999;

/** α ended on 0 with a gradient that points below it. */
export const noClustering = (maximum: NewtonMaximum): boolean => maximum.point[parameter.alpha] === 0;

/** The refusal for a highest point that is not a maximum inside the range of the model, or null. */
export const refuseMaximum = (maximum: NewtonMaximum, count: number): Refusal | null => {
  const persistence = (maximum.point[parameter.alpha] as number) + (maximum.point[parameter.beta] as number);
  if (persistence >= stationaryBelow) {
    return refuse(
      problem(
        'varianceNotStationary',
        `The GARCH fit has alpha + beta = ${persistence.toFixed(4)}, and from ${stationaryBelow} up its volatility has no long-run level. ` +
          'Ask for a longer window, or for one under 490 days, which is filtered by an exponentially weighted mean.',
      ),
    );
  }
  if (maximum.point[parameter.inverseNu] === largestInverseNu) {
    return refuse(
      problem(
        'varianceNotStationary',
        'The GARCH fit runs into 2 degrees of freedom, where the variance of a day is infinite. Ask for another window or for the student model.',
      ),
    );
  }
  if (maximum.converged) return null;
  return refuse(
    problem(
      'fitNotConverged',
      `The GARCH fit to these ${count} returns did not reach its stopping rule. Ask for another window or for the historical model.`,
    ),
  );
};
