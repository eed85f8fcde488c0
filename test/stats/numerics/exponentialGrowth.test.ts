import { describe, expect, test } from 'vitest';
import {
  type ExponentialGrowth,
  exponentialGrowth,
  fillExponentialGrowth,
} from '../../../src/stats/numerics/exponentialGrowth.ts';
import { relativeError } from '../../laws/relativeError.ts';

// mpmath 1.3.0 at 40 digits: (exp(a t) - 1)/a and mpmath.diff of it (of its power series where |a t| < 1). Columns: a, t,
// value, in the rate, in time, twice in the rate, in both, twice in time.
const expected = [
  [
    -0.3, 20, 3.325070826077779, 10.918319275148173, 0.002478752176666359, 69.48379226543268,
    0.04957504353332718, -7.436256529999077e-4,
  ],
  [
    -0.12, 4, 3.17680506828216, 5.8472625088133015, 0.6187833918061408, 14.949922906069574,
    2.4751335672245633, -0.0742540070167369,
  ],
  [0, 1.5, 1.5, 1.125, 1, 1.125, 1.5, 0],
  [
    1e-9, 2, 2.000000002, 2.000000002666667, 1.000000002, 2.666666670666667, 2.000000004,
    1.0000000020000002e-9,
  ],
  [
    0.126, 4, 5.201026691722658, 11.272148896075885, 1.655329363157055, 31.277555701278633, 6.62131745262822,
    0.2085714997577889,
  ],
  [
    0.2, 3, 4.110594001952545, 6.778811996094911, 1.822118800390509, 14.207226056623801, 5.466356401171527,
    0.36442376007810184,
  ],
  [
    1.4, 5, 782.5951131631845, 3357.550484985076, 1096.633158428458, 14786.23427910093, 5483.16579214229,
    1535.2864217998413,
  ],
] as const;

describe('growth at a rate for a time', () => {
  test.each(expected)(
    'at rate %s for time %s',
    (rate, time, value, inRate, inTime, twiceRate, both, twiceTime) => {
      const found: ExponentialGrowth = {
        value: 0,
        inRate: 0,
        inTime: 0,
        twiceRate: 0,
        rateAndTime: 0,
        twiceTime: 0,
      };
      fillExponentialGrowth(rate, time, found);
      expect(exponentialGrowth(rate, time)).toBe(found.value);
      // The second derivative in the rate is a difference of numbers up to ten times its size; all others lose less.
      expect(relativeError(found.value, value)).toBeLessThan(1e-14);
      expect(relativeError(found.inRate, inRate)).toBeLessThan(1e-14);
      expect(relativeError(found.inTime, inTime)).toBeLessThan(1e-14);
      expect(relativeError(found.twiceRate, twiceRate)).toBeLessThan(1e-13);
      expect(relativeError(found.rateAndTime, both)).toBeLessThan(1e-14);
      expect(relativeError(found.twiceTime, twiceTime)).toBeLessThan(1e-14);
    },
  );

  test('at a rate that is nearly nothing', () => expect(exponentialGrowth(5e-324, 0.01)).toBe(0.01));
});
