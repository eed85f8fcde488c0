import { chiSquareUpperTail } from '../distributions/chiSquare.ts';
import { type Shape, shapeOf } from './shape.ts';

export type JarqueBera = { readonly statistic: number; readonly p: number };

/** n/6·(g1² + g2²/4), from a shape that is at hand. */
export const jarqueBeraStatistic = (shape: Shape, count: number): number =>
  (count / 6) * (shape.skewness ** 2 + shape.excessKurtosis ** 2 / 4);

/**
 * Do skewness and kurtosis together speak against the bell curve?
 * Convention: n/6·(g1² + g2²/4) with moments of divisor n; p from the chi-square distribution with 2 degrees of freedom.
 * Domain: at least 4 finite values that are not all equal; anything else throws.
 * Units: none; p in 0..1.
 * Edges: the chi-square p is an approximation that holds for large n only; below 500 values a simulated p is better.
 * Source: Jarque & Bera 1987, International Statistical Review 55(2), 163-172.
 * Example: jarqueBera([−1, 1, −1, 1]) has statistic 2/3.
 */
export const jarqueBera = (values: ArrayLike<number>): JarqueBera => {
  const statistic = jarqueBeraStatistic(shapeOf(values), values.length);
  return { statistic, p: chiSquareUpperTail(statistic, 2) };
};
