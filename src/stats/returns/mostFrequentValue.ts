/** The value that occurs most often, by exact equality, and how often; not for an empty array. */
export const mostFrequentValue = (
  values: Float64Array,
): { readonly value: number; readonly count: number } => {
  const sorted = values.slice().sort();
  let value = sorted[0] as number;
  let count = 0;
  let run = 0;
  for (let index = 0; index < sorted.length; index += 1) {
    run = index > 0 && sorted[index] === sorted[index - 1] ? run + 1 : 1;
    if (run > count) {
      count = run;
      value = sorted[index] as number;
    }
  }
  return { value, count };
};
