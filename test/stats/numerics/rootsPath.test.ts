import { expect, it } from 'vitest';
import { expandBracket, findRoot } from '../../../src/stats/numerics/roots.ts';

/**
 * The points that Chandrupatla's method asks for, in order, the last left out (there the stopping rules differ): SciPy 1.17.1,
 * `scipy.optimize.elementwise.find_root(f, (low, high), tolerances=dict(xatol=0, xrtol=4e-16, fatol=0, frtol=0))`.
 */
const paths = [
  [
    'a cubic',
    (x: number) => x ** 3 - 2 * x - 5,
    [2.0, 3.0, 2.5, 2.084497813674, 2.094728156313, 2.094551168821, 2.094551481543],
  ],
  [
    'the fixed point of cosine',
    (x: number) => Math.cos(x) - x,
    [0.0, 1.0, 0.5, 0.749994786682, 0.738974345751, 0.739085186065, 0.739085133215],
  ],
  [
    'a steep power',
    (x: number) => x ** 9 - 0.5,
    [0.0, 2.0, 1.0, 0.5, 0.75, 0.875, 0.9375, 0.924835448525, 0.925892767702, 0.925874706683],
  ],
  [
    'an exponential',
    (x: number) => Math.exp(x) - 10,
    [-5.0, 5.0, 0.0, 2.5, 1.25, 1.875, 2.342801434744, 2.301406823663, 2.302592509275, 2.302585092878],
  ],
  [
    'a bent arctangent',
    (x: number) => Math.atan(x - 1) + 0.2 * x,
    [
      -6.0, 9.0, 1.5, -0.465008686342, 0.517495656829, 0.893471827171, 0.828761110425, 0.832056472365,
      0.832038968181,
    ],
  ],
] as const;

it.each(paths)('closes in on %s by the published steps', (_, f, expected) => {
  const asked: number[] = [];
  findRoot(
    (x) => {
      asked.push(x);
      return f(x);
    },
    expected[0],
    expected[1],
  );
  // carried to twelve decimals; interpolation between near values loses a few of them
  for (const [index, point] of expected.entries()) expect(asked[index]).toBeCloseTo(point, 9);
});

it('stops on an exact root at once, and at the last evaluation it was allowed', () => {
  // the first point asked is the middle of 0 and 1, by hand
  expect(findRoot((x) => x - 0.5, 0, 1)).toEqual({ found: true, root: 0.5, evaluations: 3 });
  expect(findRoot((x) => x - 0.5, 0, 1, { maxEvaluations: 3 })).toMatchObject({ found: true });
});

it('refuses one end without a number, and one sign at both ends whichever it is', () => {
  const openLeft = (x: number) => (x < 0 ? Number.NaN : x - 0.5);
  expect(findRoot(openLeft, -1, 1)).toEqual({ found: false, reason: 'notANumber' });
  expect(findRoot(openLeft, 1, -1)).toEqual({ found: false, reason: 'notANumber' });
  expect(findRoot(() => -1, 0, 1)).toEqual({ found: false, reason: 'noSignChange' });
});

it('answers with the better end of the last bracket', () => {
  // −1 left of 0.25 and 3 from it on: the end below the jump has the smaller size
  const below = findRoot((x) => (x < 0.25 ? -1 : 3), 0, 0.9, { absoluteTolerance: 1e-3 });
  expect(below.found && below.root).toBeLessThan(0.25);
  const above = findRoot((x) => (x < 0.25 ? -3 : 1), 0, 0.9, { absoluteTolerance: 1e-3 });
  expect(above.found && above.root).toBeGreaterThanOrEqual(0.25);
});

it('moves an end by twice the width, the one with the smaller value first', () => {
  // by hand: 0…1, then 1 + 2·1, then 3 + 2·3, then 9 + 2·9
  expect(expandBracket((x) => x - 20, 0, 1)).toEqual({ low: 0, high: 27 });
  expect(expandBracket((x) => x + 20, 0, 1)).toEqual({ low: -26, high: 1 });
  // equal values: the upper end moves
  expect(expandBracket((x) => (x < 2 ? 1 : -1), 0, 1)).toEqual({ low: 0, high: 3 });
});

it('takes a bracket as it stands when an end is a root', () => {
  expect(expandBracket((x) => x, 0, 1)).toEqual({ low: 0, high: 1 });
  expect(expandBracket((x) => -x, 0, 1)).toEqual({ low: 0, high: 1 });
  expect(expandBracket((x) => x - 1, 0, 1)).toEqual({ low: 0, high: 1 });
  expect(expandBracket((x) => 1 - x, 0, 1)).toEqual({ low: 0, high: 1 });
});

it('moves the lower end once the upper stands on its bound, and gives up when both do', () => {
  // the upper value is the smaller, yet that end cannot move; by hand 0 − 2·1
  expect(expandBracket((x) => (x < -1 ? -1 : 2 - x), 0, 1, { greatest: 1 })).toEqual({ low: -2, high: 1 });
  let asked = 0;
  const counted = () => {
    asked += 1;
    return 1;
  };
  expect(expandBracket(counted, 0, 1, { least: 0, greatest: 1 })).toBeNull();
  expect(asked).toBe(2);
  expect(expandBracket((x) => (x > 0 ? 1 : Number.NaN), 0, 1)).toBeNull();
  expect(expandBracket((x) => (x > 0 ? Number.NaN : 1), 0, 1)).toBeNull();
});

it('needs two doublings for 5 from 0 and 1, not one', () => {
  // by hand: the upper end goes to 3, then to 9
  expect(expandBracket((x) => x - 5, 0, 1, { maxDoublings: 1 })).toBeNull();
  expect(expandBracket((x) => x - 5, 0, 1, { maxDoublings: 2 })).toEqual({ low: 0, high: 9 });
});
