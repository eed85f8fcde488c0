import type { Random } from '../../terms/random.ts';
import { normalQuantile } from '../distributions/normal.ts';

/**
 * A number in [0, 1), each multiple of 2^−53 equally likely.
 *
 * Convention: the upper 27 bits of one draw, then the upper 26 of the next.
 */
export const nextDouble = (random: Random): number => {
  const upper = random.nextUint32() >>> 5;
  const lower = random.nextUint32() >>> 6;
  return (upper * 2 ** 26 + lower) * 2 ** -53;
};

/** A number in (0, 1): {@link nextDouble} drawn again while it is 0. Symmetric about one half. */
export const nextOpenDouble = (random: Random): number => {
  let drawn = nextDouble(random);
  while (drawn === 0) drawn = nextDouble(random);
  return drawn;
};

const mostIndices = 2 ** 21;

/**
 * A whole number from 0 to count − 1, each exactly equally likely.
 *
 * Convention: the upper 32 bits of draw × count; draws whose lower 32 bits fall below 2^32 mod count are rejected.
 * Domain: whole count from 1 to 2^21, so that the product is exact in a double; anything else throws.
 * Source: Lemire 2019, ACM Transactions on Modeling and Computer Simulation 29 (1), article 3.
 * Example: `nextIndex(random, 60)` picks one of sixty returns.
 */
export const nextIndex = (random: Random, count: number): number => {
  if ((count | 0) !== count || count < 1 || count > mostIndices) {
    throw new RangeError(`nextIndex: count ${count} is not a whole number from 1 to ${mostIndices}`);
  }
  let drawn = random.nextUint32();
  let lower = Math.imul(drawn, count) >>> 0;
  if (lower < count) {
    const rejectedBelow = 2 ** 32 % count;
    while (lower < rejectedBelow) {
      drawn = random.nextUint32();
      lower = Math.imul(drawn, count) >>> 0;
    }
  }
  return (drawn * count * 2 ** -32) | 0;
};

/** A standard normal number: the quantile of an open double, so one number for two draws of 32 bits. */
export const nextNormal = (random: Random): number => normalQuantile(nextOpenDouble(random));
