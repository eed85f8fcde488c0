import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { expandBracket, findRoot, type RootOutcome } from '../../../src/stats/numerics/roots.ts';

const rootOf = (outcome: RootOutcome): number => {
  if (!outcome.found) throw new Error(outcome.reason);
  return outcome.root;
};

describe('findRoot', () => {
  it('finds roots to the last places', () => {
    // √2 and the fixed point of cosine (0.7390851332151607, mpmath 1.3.0 findroot); two units in the last place allowed
    expect(Math.abs(rootOf(findRoot((x) => x * x - 2, 0, 2)) - Math.SQRT2)).toBeLessThanOrEqual(2 ** -51);
    expect(Math.abs(rootOf(findRoot((x) => Math.cos(x) - x, 1, 0)) - 0.7390851332151607)).toBeLessThanOrEqual(
      2 ** -52,
    );
  });

  it('keeps its head where interpolation is no help', () => {
    // a triple root, a wall, a jump and a cliff of 300 powers of ten: bisection's pace at worst
    for (const [f, low, high, root] of [
      [(x: number) => (x - 0.3) ** 3, -1, 2, 0.3],
      [(x: number) => Math.tanh(1e4 * (x - 0.123)), -10, 10, 0.123],
      [(x: number) => (x < 0.77 ? -1 : 1), 0, 1, 0.77],
      [(x: number) => (x === 0.5 ? 0 : 1 / (x - 0.5)), 0, 1.2, 0.5],
      [(x: number) => Math.exp(x) - 1e-300, -1000, 10, Math.log(1e-300)],
    ] as const) {
      const outcome = findRoot(f, low, high);
      // a triple root is flat: within 1e-107 of zero over 1e-5… of its place no method sees more, hence 1e-9
      expect(Math.abs(rootOf(outcome) - root)).toBeLessThan(1e-9);
    }
  });

  it('takes an end that is a root, and infinite values by their sign', () => {
    expect(findRoot((x) => x, 0, 1)).toEqual({ found: true, root: 0, evaluations: 2 });
    expect(findRoot((x) => x - 1, 0, 1)).toEqual({ found: true, root: 1, evaluations: 2 });
    expect(rootOf(findRoot((x) => Math.log(x), 0, 3))).toBeCloseTo(1, 14);
  });

  it('stops at the tolerance asked for', () => {
    let count = 0;
    const counted = (x: number): number => {
      count += 1;
      return x ** 3 - 5;
    };
    const outcome = findRoot(counted, 0, 10, { absoluteTolerance: 1e-3 });
    expect(Math.abs(rootOf(outcome) - Math.cbrt(5))).toBeLessThan(1e-3);
    expect(outcome).toMatchObject({ evaluations: count });
    expect(count).toBeLessThan(15);
  });

  it('finds a root at zero without asking for ever', () => {
    const outcome = findRoot((x) => Math.tanh(x) + 1e-40, -1, 1);
    expect(Math.abs(rootOf(outcome))).toBeLessThan(1e-24);
    expect(outcome).toMatchObject({ found: true });
  });

  it('says why it found none', () => {
    expect(findRoot((x) => x * x + 1, -1, 1)).toEqual({ found: false, reason: 'noSignChange' });
    expect(findRoot(() => Number.NaN, -1, 1)).toEqual({ found: false, reason: 'notANumber' });
    expect(findRoot((x) => (Math.abs(x) < 0.9 ? Number.NaN : x), -1, 1)).toEqual({
      found: false,
      reason: 'notANumber',
    });
    expect(findRoot((x) => x - 0.3, 0, 1, { maxEvaluations: 3 })).toEqual({
      found: false,
      reason: 'tooManySteps',
    });
  });

  it('finds the root of any rising cubic', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -50, max: 50, noNaN: true }),
        fc.double({ min: 0, max: 10, noNaN: true }),
        (root, bend) => {
          const found = rootOf(findRoot((x) => (x - root) * (1 + bend * (x - root) ** 2), -60, 61));
          // twice the relative tolerance of two units in the last place, and the rounding of x − root
          expect(Math.abs(found - root)).toBeLessThan(4 * Number.EPSILON * (1 + Math.abs(root)));
        },
      ),
      { seed: 1997 },
    );
  });
});

describe('expandBracket', () => {
  it('walks until the signs differ, on either side', () => {
    for (const root of [-5000, 0.25, 100]) {
      const bracket = expandBracket((x) => x - root, 0, 1);
      expect(bracket?.low).toBeLessThanOrEqual(root);
      expect(bracket?.high).toBeGreaterThanOrEqual(root);
    }
  });

  it('stays within its bounds', () => {
    expect(expandBracket((x) => x + 1, 0.5, 1, { least: 0, greatest: 50 })).toBeNull();
    const asked: number[] = [];
    const noted = (x: number): number => {
      asked.push(x);
      return x + 1;
    };
    expandBracket(noted, 0.5, 1, { least: 0, greatest: 50 });
    expect(Math.min(...asked)).toBe(0);
    expect(Math.max(...asked)).toBe(50);
  });

  it('gives up on no number and on too many doublings', () => {
    expect(expandBracket(() => Number.NaN, 0, 1)).toBeNull();
    expect(expandBracket(() => 1, 0, 1, { maxDoublings: 5 })).toBeNull();
  });
});
