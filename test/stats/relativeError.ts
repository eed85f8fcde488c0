/** How far a figure is from what was expected, as a share of the expected one; absolute where nothing is expected. */
export const relativeError = (actual: number, expected: number): number =>
  expected === 0 ? Math.abs(actual) : Math.abs(actual - expected) / Math.abs(expected);
