/** Σ coefficients[k]·x^k by Horner's rule. Not empty. */
export const polynomial = (coefficients: readonly number[], x: number): number => {
  let sum = 0;
  for (let power = coefficients.length - 1; power >= 0; power -= 1) {
    sum = sum * x + (coefficients[power] as number);
  }
  return sum;
};
