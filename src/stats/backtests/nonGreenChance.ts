import { type Level, tailFraction } from '../../terms/level.ts';
import { binomialUpperTail } from '../distributions/binomial.ts';
import { trafficLight } from './trafficLight.ts';

/** The least count of exceedances that is not green; null where there are no zones. */
const firstNonGreen = (days: number, tailLevel: Level): number | null => {
  for (let count = 0; count <= days; count += 1) {
    const light = trafficLight(count, days, tailLevel);
    if (light === null) return null;
    if (light.zone !== 'green') return count;
  }
  return null;
};

/**
 * How likely is a model that is right to stand in the yellow or the red zone all the same?
 *
 * Convention: exceedances binomial with `days` and 1 − a; the zones are those of {@link trafficLight}.
 * Domain: whole days ≥ 1.
 * Units: days in, probability as a fraction out.
 * Edges: null where there are no zones, since too few exceedances are expected.
 * Source: Basel Committee on Banking Supervision, January 1996, "Supervisory framework for the use of backtesting", table 1.
 * Example: 250 days at 99%: five or more exceedances, 0.1078.
 */
export const nonGreenChance = (days: number, tailLevel: Level): number | null => {
  const first = firstNonGreen(days, tailLevel);
  return first === null ? null : binomialUpperTail(first, days, tailFraction(tailLevel));
};
