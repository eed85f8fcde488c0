import { studentTDensity, studentTQuantile } from '../distributions/studentT.ts';

/** The quantile of t(nu) that `tail` lies above; VaR in scales beyond the location. nu may be Infinity. */
export const quantileMultiplier = (tail: number, nu: number): number => -studentTQuantile(tail, nu);

/** (1 − 1/nu) times the mean of t(nu) beyond that quantile, which stays finite at nu = 1. */
export const shortfallNumerator = (tail: number, nu: number): number => {
  const quantile = studentTQuantile(tail, nu);
  return (studentTDensity(quantile, nu) / tail) * (1 + (quantile / nu) * quantile);
};

/** The mean of t(nu) beyond its quantile, nu > 1: ES in scales beyond the location. */
export const shortfallMultiplier = (tail: number, nu: number): number =>
  shortfallNumerator(tail, nu) / (1 - 1 / nu);
