import { studentDensity } from './internal/studentDensity.ts';
import { upperStudentQuantile } from './internal/studentQuantile.ts';
import { twoSidedTail } from './internal/studentTail.ts';
import { normalDensity, normalQuantile, normalUpperTail } from './normal.ts';

const mustBeInDomain = (name: string, t: number, nu: number): void => {
  if (!(nu > 0)) throw new RangeError(`${name}: nu = ${nu} is not above 0`);
  if (Number.isNaN(t)) throw new RangeError(`${name}: t is not a number`);
};

export const studentTDensity = (t: number, nu: number): number => {
  mustBeInDomain('studentTDensity', t, nu);
  return nu === Number.POSITIVE_INFINITY ? normalDensity(t) : studentDensity(t, nu);
};

export const studentTTwoSidedTail = (t: number, nu: number): number => {
  mustBeInDomain('studentTTwoSidedTail', t, nu);
  const size = Math.abs(t);
  if (size === Number.POSITIVE_INFINITY) return 0;
  return nu === Number.POSITIVE_INFINITY ? 2 * normalUpperTail(size) : twoSidedTail(size, nu);
};

export const studentTUpperTail = (t: number, nu: number): number => {
  const half = studentTTwoSidedTail(t, nu) / 2;
  return t < 0 ? 1 - half : half;
};

export const studentTCdf = (t: number, nu: number): number => studentTUpperTail(-t, nu);

export const studentTQuantile = (p: number, nu: number): number => {
  if (!(p > 0 && p < 1)) throw new RangeError(`studentTQuantile: p = ${p} does not lie inside (0, 1)`);
  mustBeInDomain('studentTQuantile', 0, nu);
  if (nu === Number.POSITIVE_INFINITY) return normalQuantile(p);
  return p < 0.5 ? -upperStudentQuantile(p, nu) : upperStudentQuantile(1 - p, nu);
};
