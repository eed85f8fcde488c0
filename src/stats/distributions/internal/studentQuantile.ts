import jStat from 'jstat';
import { normalQuantile } from '../normal.ts';
import { finishQuantile } from './finishQuantile.ts';
import { studentDensity } from './studentDensity.ts';
import { centralProbability, twoSidedTail } from './studentTail.ts';

/** The point t ≥ 0 with P(T > t) = tail, for 0 < tail ≤ ½. */
export const upperStudentQuantile = (tail: number, nu: number): number => {
  const central = 0.5 - tail;
  const below1 = tail > 0.3 && central < centralProbability(1, nu);
  return below1 ? nearCentre(central, nu) : inTail(tail, nu);
};

/** The probability between 0 and t bends downwards, so Newton's steps from its tangent at 0 rise to the answer. */
const nearCentre = (central: number, nu: number): number => {
  if (central === 0) return 0;
  return finishQuantile({
    start: central / studentDensity(0, nu),
    low: 0,
    high: 1,
    residual: (t) => centralProbability(t, nu) - central,
    slope: (t) => studentDensity(t, nu),
  });
};

const logLargest = Math.log(Number.MAX_VALUE);

/** Solved for ln t on the logarithm of the tail, which is nearly a straight line when the tail is heavy. */
const inTail = (tail: number, nu: number): number => {
  const logTwoSided = Math.log(2 * tail);
  if (twoSidedTail(Number.MAX_VALUE, nu) > 2 * tail) return Number.POSITIVE_INFINITY;
  const logQuantile = finishQuantile({
    start: Math.log(startOf(tail, nu)),
    low: -2,
    high: logLargest,
    residual: (logT) => logTwoSided - Math.log(twoSidedTail(Math.exp(logT), nu)),
    slope: (logT) => {
      const t = Math.exp(logT);
      return (2 * t * studentDensity(t, nu)) / twoSidedTail(t, nu);
    },
  });
  return Math.exp(logQuantile);
};

const startOf = (tail: number, nu: number): number => {
  const given = -jStat.studentt.inv(tail, nu);
  return given > 0 && given < Number.POSITIVE_INFINITY ? given : -normalQuantile(tail);
};
