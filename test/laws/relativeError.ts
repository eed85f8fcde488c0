/** |actual/expected − 1|, and |actual| itself where 0 is expected. NaN compares false with every tolerance, so it fails. */
export const relativeError = (actual: number, expected: number): number =>
  expected === 0 ? Math.abs(actual) : Math.abs((actual - expected) / expected);
