import type { Picks, ResampledStatistic } from './replicates.ts';

/** All indices of a sample but one. */
const writeAllBut = (left: number, picks: Uint32Array): void => {
  for (let place = 0; place < picks.length; place += 1) picks[place] = place < left ? place : place + 1;
};

const allOf = (count: number): Uint32Array => Uint32Array.from({ length: count }, (_, index) => index);

const replaced = (whole: Picks, sample: number, picks: Uint32Array): Picks => {
  const [first, ...others] = whole;
  if (sample === 0) return [picks, ...others];
  return [first, ...others.map((other, place) => (place === sample - 1 ? picks : other))];
};

/** Σ l and the like for one sample: l is the mean of the leave-one-out values minus each of them, times (n − 1)/n. */
const influencePowers = (whole: Picks, sample: number, statistic: ResampledStatistic) => {
  const count = whole[sample]?.length ?? 0;
  const picks = new Uint32Array(count - 1);
  const withPicks = replaced(whole, sample, picks);
  const leftOut = new Float64Array(count);
  let sum = 0;
  for (let left = 0; left < count; left += 1) {
    writeAllBut(left, picks);
    const value = statistic(withPicks);
    leftOut[left] = value;
    sum += value;
  }
  let squares = 0;
  let cubes = 0;
  for (const value of leftOut) {
    const influence = ((sum / count - value) * (count - 1)) / count;
    squares += influence ** 2;
    cubes += influence ** 3;
  }
  return { squares, cubes };
};

/** The statistic of the sample as it is. */
export const wholeSamples = (counts: readonly [number, ...number[]]): Picks => {
  const [first, ...others] = counts;
  return [allOf(first), ...others.map(allOf)];
};

/**
 * How does the spread of a statistic change with its value?
 * Convention: a = Σ l³ / (6·(Σ l²)^1.5) over all values of all samples, l the jackknife influence of a value divided by
 * the count of its own sample; one sample (or paired ones) is the case of Efron 1987.
 * Domain: a statistic that exists when any one value is left out; null where it does not.
 * Edges: 0 where no value matters.
 * Source: Efron 1987, Journal of the American Statistical Association 82, 171-185, by the jackknife; several samples:
 * Davison & Hinkley 1997, Bootstrap Methods and their Application, section 5.3.
 */
export const jackknifeAcceleration = (whole: Picks, statistic: ResampledStatistic): number | null => {
  let squares = 0;
  let cubes = 0;
  for (let sample = 0; sample < whole.length; sample += 1) {
    const powers = influencePowers(whole, sample, statistic);
    squares += powers.squares;
    cubes += powers.cubes;
  }
  if (!Number.isFinite(squares)) return null;
  return squares === 0 ? 0 : cubes / (6 * squares * Math.sqrt(squares));
};
