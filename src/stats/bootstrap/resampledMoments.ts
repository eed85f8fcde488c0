/** Below this share of the mean square, a variance taken as a difference of sums has lost half of its digits. */
const cancelledShare = 1e-8;

const exactVariance = (values: Float64Array, picks: Uint32Array, mean: number): number => {
  const first = values[picks[0] as number] as number;
  let differs = false;
  let squares = 0;
  for (let place = 0; place < picks.length; place += 1) {
    const value = values[picks[place] as number] as number;
    if (value !== first) differs = true;
    squares += (value - mean) ** 2;
  }
  return differs ? squares / (picks.length - 1) : 0;
};

/**
 * Mean and sample standard deviation (n − 1) of the picked values, written to moments[0] and moments[1].
 * The values should be centred near zero, which keeps the one-pass sums exact enough for a bootstrap; where a resample
 * hardly varies the deviation is taken again in two passes, and is exactly 0 when all picks are equal.
 */
export const writeResampledMoments = (
  values: Float64Array,
  picks: Uint32Array,
  moments: Float64Array,
): void => {
  const count = picks.length;
  let sum = 0;
  let squares = 0;
  for (let place = 0; place < count; place += 1) {
    const value = values[picks[place] as number] as number;
    sum += value;
    squares += value * value;
  }
  const mean = sum / count;
  const centredSquares = squares - sum * mean;
  const variance =
    centredSquares > cancelledShare * squares
      ? centredSquares / (count - 1)
      : exactVariance(values, picks, mean);
  moments[0] = mean;
  moments[1] = Math.sqrt(variance);
};
