import { unitStudentConstant } from './studentConstant.ts';
import { innovationLoss } from './studentInnovation.ts';

/** Where each parameter stands in a parameter vector of the fit. */
export const parameter = { mu: 0, logOmega: 1, alpha: 2, beta: 3, inverseNu: 4 } as const;
export const parameterCount = 5;

/** The mean squared deviation from mu: the variance before the first day, and its squared residual. */
export const presampleVariance = (returns: Float64Array, mu: number): number => {
  let sum = 0;
  for (let day = 0; day < returns.length; day += 1) sum += ((returns[day] as number) - mu) ** 2;
  return sum / returns.length;
};

/** The log-likelihood alone. −Infinity where the variance recursion overflows. */
export const garchLogLikelihood = (returns: Float64Array, point: Float64Array): number => {
  const mu = point[parameter.mu] as number;
  const omega = Math.exp(point[parameter.logOmega] as number);
  const alpha = point[parameter.alpha] as number;
  const beta = point[parameter.beta] as number;
  const inverseNu = point[parameter.inverseNu] as number;
  let variance = presampleVariance(returns, mu);
  let squared = variance;
  let loss = 0;
  for (let day = 0; day < returns.length; day += 1) {
    variance = omega + alpha * squared + beta * variance;
    squared = ((returns[day] as number) - mu) ** 2;
    loss += Math.log(variance) / 2 + innovationLoss(squared / variance, inverseNu);
  }
  const value = returns.length * unitStudentConstant(inverseNu).value - loss;
  return Number.isNaN(value) ? -Infinity : value;
};
