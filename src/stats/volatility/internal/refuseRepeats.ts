import { problem } from '../../../terms/problem.ts';
import { type Refusal, refuse } from '../../../terms/result.ts';
import { mostFrequentValue } from '../../returns/mostFrequentValue.ts';

/**
 * The refusal for returns among which one value is so frequent that the likelihood has no highest point, or null.
 * With mu at that value and ω → 0 a repeat gains ½·|ln ω| where the day before repeated too, and a return that breaks the
 * run costs nu/2·|ln ω|, nu > 2: the gains win from two repeats for each break up. With a constant variance they win from two thirds
 * of all returns up. Short runs that win by chance are no maximum a climb would find, so a third of all returns is asked.
 */
export const refuseRepeats = (returns: Float64Array, figure: string): Refusal | null => {
  const { value, count } = mostFrequentValue(returns);
  let repeats = 0;
  let breaks = 0;
  for (let day = 1; day < returns.length; day += 1) {
    if (returns[day - 1] !== value) continue;
    if (returns[day] === value) repeats += 1;
    else breaks += 1;
  }
  const unbounded = 3 * count >= 2 * returns.length || (3 * count >= returns.length && repeats >= 2 * breaks);
  if (!unbounded) return null;
  return refuse(
    problem(
      'likelihoodUnbounded',
      `${figure} needs returns that seldom repeat, and the return ${value} occurs ${count} times in ${returns.length}: ` +
        `its likelihood has no highest point. Ask for a longer window or for the historical model.`,
    ),
  );
};
