import type { Random } from '../../terms/random.ts';
import { nextIndex } from '../random/draws.ts';

/**
 * How one sample is drawn again from itself: fills `picks` with indices of the `count` original values. The same
 * array is filled for every resample, so that a bootstrap allocates nothing in its loop.
 */
export type ResampleDraw = {
  readonly count: number;
  readonly fill: (random: Random, picks: Uint32Array) => void;
};

/** Each pick independent of the others: the bootstrap of Efron 1979, for values without dependence. */
export const independentDraw = (count: number): ResampleDraw => ({
  count,
  fill: (random, picks) => {
    for (let place = 0; place < picks.length; place += 1) picks[place] = nextIndex(random, count);
  },
});

/**
 * Runs of neighbours: each pick is the one after its predecessor, or, with probability 1/blockLength, a fresh start
 * anywhere. After the last value comes the first.
 * Convention: the mean block length is any real number from 1 (independent picks); the probability is kept to 2^-32.
 * Source: Politis & Romano 1994, Journal of the American Statistical Association 89, 1303-1313 (stationary bootstrap).
 */
export const stationaryDraw = (count: number, blockLength: number): ResampleDraw => {
  if (!(blockLength >= 1))
    throw new RangeError(`stationaryDraw: expected a mean block length of at least 1, got ${blockLength}`);
  const startBelow = Math.round(2 ** 32 / blockLength);
  return {
    count,
    fill: (random, picks) => {
      let index = nextIndex(random, count);
      for (let place = 0; place < picks.length; place += 1) {
        picks[place] = index;
        index = index + 1 === count ? 0 : index + 1;
        if (random.nextUint32() < startBelow) index = nextIndex(random, count);
      }
    },
  };
};
