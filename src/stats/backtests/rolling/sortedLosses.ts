/** The losses of a window kept in ascending order while it moves: one leaves, one enters. */
export type SortedLosses = {
  readonly values: Float64Array;
  readonly replace: (leaving: number, entering: number) => void;
};

/** Index of the first value that is not below `target`. */
const firstNotBelow = (values: Float64Array, target: number): number => {
  let low = 0;
  let high = values.length;
  while (low < high) {
    const middle = (low + high) >>> 1;
    if ((values[middle] as number) < target) low = middle + 1;
    else high = middle;
  }
  return low;
};

export const createSortedLosses = (returns: Float64Array): SortedLosses => {
  const values = returns.map((value) => 0 - value).sort();
  return {
    values,
    replace: (leaving, entering) => {
      const from = firstNotBelow(values, leaving);
      const found = firstNotBelow(values, entering);
      // The place is counted without the value that leaves.
      const to = found > from ? found - 1 : found;
      if (to > from) values.copyWithin(from, from + 1, to + 1);
      else values.copyWithin(to + 1, to, from);
      values[to] = entering;
    },
  };
};
