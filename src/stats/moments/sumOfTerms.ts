import { compensatedSum } from '../numerics/sum.ts';

/** Σ term(i) for i = from..to−1, compensated, so that the order and the count of the terms cost no digits. */
export const sumOfTerms = (from: number, to: number, term: (index: number) => number): number => {
  const terms = new Float64Array(Math.max(0, to - from));
  for (let index = from; index < to; index += 1) terms[index - from] = term(index);
  return compensatedSum(terms);
};
