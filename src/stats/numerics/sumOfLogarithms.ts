/** Factors to one logarithm: so many numbers between 1e-38 and 1e38 neither overflow nor underflow when multiplied. */
const factorsPerLogarithm = 8;

/**
 * Σ ln of the values from place `first` on, as logarithms of products: several times as fast as one by one.
 *
 * Domain: positive values, from 1e-38 to 1e38 for a finite result; a product that overflows gives Infinity.
 * Example: `sumOfLogarithms(Float64Array.of(9, 1, Math.E), 1)` is 1.
 */
export const sumOfLogarithms = (values: Float64Array, first: number): number => {
  let sum = 0;
  let product = 1;
  let factors = 0;
  for (let index = first; index < values.length; index += 1) {
    product *= values[index] as number;
    factors += 1;
    if (factors === factorsPerLogarithm) {
      sum += Math.log(product);
      product = 1;
      factors = 0;
    }
  }
  return sum + Math.log(product);
};
