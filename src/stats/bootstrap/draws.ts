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

const words = 2 ** 32;

/** Up to this count two indices come from one word with less than 2% of the words rejected. */
const mostForPairs = 2 ** 13;

const fillOneByOne =
  (count: number): ResampleDraw['fill'] =>
  (random, picks) => {
    for (let place = 0; place < picks.length; place += 1) picks[place] = nextIndex(random, count);
  };

/** Two indices from each word: the words are cut into count² cells of equal width, and what is left over is rejected. */
const fillInPairs = (count: number): ResampleDraw['fill'] => {
  const width = Math.floor(words / (count * count));
  const accepted = width * count * count;
  return (random, picks) => {
    const paired = picks.length - (picks.length % 2);
    for (let place = 0; place < paired; place += 2) {
      let word = random.nextUint32();
      while (word >= accepted) word = random.nextUint32();
      const cell = (word / width) >>> 0;
      const first = (cell / count) >>> 0;
      picks[place] = first;
      picks[place + 1] = cell - first * count;
    }
    if (paired < picks.length) picks[paired] = nextIndex(random, count);
  };
};

/** Each pick independent of the others and exactly equally likely: the bootstrap of Efron 1979. */
export const independentDraw = (count: number): ResampleDraw => ({
  count,
  fill: count <= mostForPairs ? fillInPairs(count) : fillOneByOne(count),
});

/**
 * Runs of neighbours: each pick is the one after its predecessor, or, with probability 1/blockLength, a fresh start
 * anywhere. After the last value comes the first.
 * Convention: the mean block length is any real number from 1, which means independent picks; the probability is kept to
 * 2^-32. One word decides both whether a block starts and where: the words below the threshold are cut into cells.
 * Source: Politis & Romano 1994, Journal of the American Statistical Association 89, 1303-1313 (stationary bootstrap).
 */
export const stationaryDraw = (count: number, blockLength: number): ResampleDraw => {
  if (!(blockLength >= 1))
    throw new RangeError(`stationaryDraw: expected a mean block length of at least 1, got ${blockLength}`);
  if (blockLength === 1) return independentDraw(count);
  const startBelow = Math.round(words / blockLength);
  const width = Math.floor(startBelow / count);
  if (width === 0)
    throw new RangeError(`stationaryDraw: ${count} values are too many for blocks of ${blockLength}`);
  const fill = (random: Random, picks: Uint32Array): void => {
    let index = nextIndex(random, count);
    for (let place = 0; place < picks.length; place += 1) {
      picks[place] = index;
      const word = random.nextUint32();
      const following = index + 1 === count ? 0 : index + 1;
      index = word < startBelow ? (word / width) >>> 0 : following;
      // The few words left over by the cells: a block does start, and its place is drawn anew.
      if (index >= count) index = nextIndex(random, count);
    }
  };
  return { count, fill };
};
