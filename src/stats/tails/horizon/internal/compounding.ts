import type { ReturnType } from '../../../../terms/returns.ts';

/** Whose loss it is: a short position loses when the price rises, and its daily returns are those of the price negated. */
export type HeldPosition = 'long' | 'short';

/** The loss of a path of daily returns over its whole length, a gain when negative. */
export type PathLoss = (path: Float64Array) => number;

const sumOf = (path: Float64Array): number => {
  let sum = 0;
  for (let day = 0; day < path.length; day += 1) sum += path[day] as number;
  return sum;
};

/** Growth of the price; `sign` turns the returns of a position into those of the price. A price at 0 stays there. */
const growthOf = (path: Float64Array, sign: 1 | -1): number => {
  let growth = 1;
  for (let day = 0; day < path.length; day += 1) {
    const factor = 1 + sign * (path[day] as number);
    if (factor <= 0) return 0;
    growth *= factor;
  }
  return growth;
};

/**
 * Log returns add, and the loss is one of log returns; simple returns compound, floored at −100% a day, and the loss is
 * a fraction of the position's first value. A short position is not rebalanced: it owes what the price has become.
 */
export const pathLossOf = (returnType: ReturnType, position: HeldPosition): PathLoss => {
  if (returnType === 'log') return (path) => -sumOf(path);
  return position === 'long' ? (path) => 1 - growthOf(path, 1) : (path) => growthOf(path, -1) - 1;
};

/** The same loss as a fraction of the position's first value in money. */
export const moneyFractionOf = (
  returnType: ReturnType,
  position: HeldPosition,
): ((loss: number) => number) => {
  if (returnType === 'simple') return (loss) => loss;
  return position === 'long' ? (loss) => -Math.expm1(-loss) : (loss) => Math.expm1(loss);
};
