import { describe, expect, test } from 'vitest';
import {
  innovationLoss,
  innovationTerms,
} from '../../../../src/stats/volatility/internal/studentInnovation.ts';
import { relativeError } from '../../../laws/relativeError.ts';

// mpmath 1.3.0 at 30 digits: A(q, l) = (1+l)/(2l) log(1 + lq/(1-2l)) and mpmath.diff of it. Columns: q, 1/nu,
// A, A_q, A_qq, A_l, A_ql, A_ll; the last three are numeric derivatives, good to about 9 digits.
const expected: readonly (readonly number[])[] = [
  [
    0.3, 1e-6, 0.150000427500792, 0.500001350002295, -5.00002200006035e-7, 0.42750158400441146,
    1.3500045900117046, 1.5840088229578337,
  ],
  [
    0.3, 0.01, 0.1543556983687219, 0.513733468972533, -0.005226179745397081, 0.44379235172055576,
    1.3970975557002099, 1.675617583866471,
  ],
  [
    0.3, 0.2, 0.2859305394129746, 0.9090909090909091, -0.27548209366391185, 1.081350025173212,
    3.0991735537190084, 6.404130602262371,
  ],
  [
    0.3, 0.45, 1.3765580286958867, 3.0851063829787235, -5.907650520597556, 18.45770840959626,
    24.44545043005885, 506.46732482913757,
  ],
  [
    4, 1e-6, 2.0000020000026666, 0.499999500001, -4.999985000039999e-7, 2.0000053333413335, -0.499998000006,
    5.333349333410133,
  ],
  [
    4, 0.01, 2.020269397991808, 0.4950980392156863, -0.0048539023452518265, 2.054159264437366,
    -0.4805843906189927, 5.501146899076054,
  ],
  [
    4, 0.2, 2.541893581161611, 0.42857142857142855, -0.061224489795918366, 3.6944910308742407,
    -0.25510204081632654, 14.0754978545229,
  ],
  [
    4, 0.45, 4.743818355323709, 0.3815789473684211, -0.09037396121883656, 26.647908953325228,
    -0.13850415512465375, 571.0077546057203,
  ],
  [
    60, 1e-6, 29.99919003167862, 0.4999715016529041, -4.999425049876149e-7, -809.9366441458632,
    -28.49669428759976, 63351.70853059182,
  ],
  [
    60, 0.01, 24.120191494997943, 0.31962025316455694, -0.002022912994712386, -431.2790789377481,
    -11.416439673129306, 22290.319383598482,
  ],
  [
    60, 0.2, 9.13356731317027, 0.047619047619047616, -0.0007558578987150416, -14.247006662018977,
    -0.17951625094482238, 151.9182903541278,
  ],
  [
    60, 0.45, 9.025635878083962, 0.02675276752767528, -0.00044423414713851936, 21.83796455324679,
    -0.03880666112934192, 589.2075449980263,
  ],
];

describe('the data part of a unit-variance Student log-density', () => {
  test.each(expected)('at q = %s, 1/nu = %s', (q, inverseNu, ...values) => {
    const terms = new Float64Array(6);
    innovationTerms(q as number, inverseNu as number, terms);
    // The first three are closed forms, a few roundings each; the rest are limited by the numeric derivatives.
    const tolerances = [1e-14, 1e-14, 1e-14, 1e-8, 1e-8, 1e-7];
    values.forEach((value, index) => {
      expect(relativeError(terms[index] as number, value)).toBeLessThan(tolerances[index] as number);
    });
    expect(innovationLoss(q as number, inverseNu as number)).toBe(terms[0]);
  });

  test('is the normal density at 1/nu = 0', () => {
    const terms = new Float64Array(6);
    innovationTerms(3, 0, terms);
    // By hand, the limits of the series: A = q/2, A_l = 3q/2 − q²/4.
    expect(terms[0]).toBe(1.5);
    expect(terms[1]).toBe(0.5);
    expect(terms[3]).toBe(4.5 - 2.25);
  });

  test('joins its series and its closed form without a step', () => {
    const below = new Float64Array(6);
    const above = new Float64Array(6);
    const inverseNu = 0.05;
    const q = (0.05 / inverseNu) * (1 - 2 * inverseNu);
    innovationTerms(q * (1 - 1e-12), inverseNu, below);
    innovationTerms(q * (1 + 1e-12), inverseNu, above);
    // The closed form of G' divides a rounding error by x² = 1/400 twice.
    below.forEach((value, index) => {
      expect(relativeError(above[index] as number, value)).toBeLessThan(1e-9);
    });
  });
});

test('the normal limit: half of q, without a division of zero by zero', () => {
  // A(q, λ) → q/2 as λ → 0, by definition of the normal density; below λ = 1e-17 a double shows no difference.
  for (const q of [0, 0.3, 7]) {
    expect(innovationLoss(q, 0)).toBe(q / 2);
    expect(innovationLoss(q, 1e-18)).toBe(q / 2);
  }
});
