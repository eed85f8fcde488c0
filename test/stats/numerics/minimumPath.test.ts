import { expect, it } from 'vitest';
import { minimiseOnInterval } from '../../../src/stats/numerics/minimum.ts';

/**
 * The points that Brent's method asks for, in order: SciPy 1.17.1, `scipy.optimize.fminbound(f, low, high, xtol=1e-4)`, with f
 * noting its argument. That routine's tolerance is √epsilon of the argument and a third of xtol.
 */
const paths = [
  [
    'an uneven curve',
    (x: number) => x * Math.log(x),
    0.01,
    3,
    [
      1.1520783736, 1.8579216264, 0.7158432527, 0.4462351209, 0.2478650692, 0.3795476233, 0.3725438698,
      0.3672963939, 0.3678592606, 0.3678925994, 0.3679259382,
    ],
  ],
  [
    'a quartic',
    (x: number) => x ** 4 - 3 * x ** 3 + 2,
    -1,
    4,
    [
      0.9098300563, 2.0901699437, 2.8196601125, 1.9715905365, 2.1923845024, 2.4319824651, 2.2408096583,
      2.2536788594, 2.2500862857, 2.249989818, 2.2500231847, 2.2499564513,
    ],
  ],
  [
    'a corner',
    (x: number) => Math.abs(x - 1.25),
    -3,
    7,
    [
      0.8196601125, 3.1803398875, -0.639320225, 1.2579687383, 1.9922491783, 1.3265333922, 1.1631862626,
      1.247665825, 1.2052218452, 1.2434931673, 1.2502584223, 1.253203501, 1.2501932702, 1.24952403,
      1.2499376432, 1.2498970938, 1.2500153022, 1.2500832799, 1.2499819504, 1.2500486541,
    ],
  ],
  [
    'a falling line',
    (x: number) => -x,
    1,
    2,
    [
      1.3819660113, 1.6180339887, 1.7639320225, 1.8541019662, 1.9098300563, 1.94427191, 1.9655581463,
      1.9787137637, 1.9868443825, 1.9918693812, 1.9949750013, 1.99689438, 1.9980806213, 1.9988137587,
      1.9992668626, 1.9995468961, 1.9997199664, 1.9998269297, 1.9998930367, 1.999933893,
    ],
  ],
  [
    'two bottoms',
    (x: number) => Math.sin(3 * x) + 0.1 * x * x,
    -4,
    3,
    [
      -1.3262379212, 0.3262379212, 1.3475241575, 1.9787137637, 1.3135992264, 1.5377973518, 1.5459317429,
      1.536352218, 1.5365902874, 1.5365569313, 1.5366236435,
    ],
  ],
  [
    'a flat floor',
    (x: number) => Math.max(0, Math.abs(x - 0.3) - 0.2),
    -2,
    1,
    [
      -0.8541019662, -0.1458980338, 0.2917960675, 0.8075158853, 0.3042056619, 0.2980008647, 0.2956308431,
      0.2941660891, 0.2932608214, 0.2927013352, 0.2923555537, 0.292141849, 0.2920097722, 0.2919281443,
      0.2918776954, 0.2918443578,
    ],
  ],
] as const;

const sameAs = { relativeTolerance: Math.sqrt(Number.EPSILON), absoluteTolerance: 1e-4 / 3 };

it.each(paths)('walks down %s by the published steps', (_, f, low, high, expected) => {
  const asked: number[] = [];
  const outcome = minimiseOnInterval(
    (x) => {
      asked.push(x);
      return f(x);
    },
    low,
    high,
    sameAs,
  );
  expect(outcome).toMatchObject({ converged: true, evaluations: expected.length });
  expect(asked.length).toBe(expected.length);
  // the points are carried to ten decimals, and a parabola through near values loses a few of the digits
  for (const [index, point] of expected.entries()) expect(asked[index]).toBeCloseTo(point, 7);
});
