import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { betaCdf, betaQuantile, betaUpperTail } from '../../../src/stats/distributions/beta.ts';
import { binomialCdf, binomialMass, binomialUpperTail } from '../../../src/stats/distributions/binomial.ts';
import {
  chiSquareCdf,
  chiSquareQuantile,
  chiSquareUpperQuantile,
  chiSquareUpperTail,
} from '../../../src/stats/distributions/chiSquare.ts';
import { logGamma, logGammaDifference } from '../../../src/stats/distributions/gammaFunctions.ts';
import {
  noncentralityAt,
  noncentralTCdf,
  noncentralTUpperTail,
} from '../../../src/stats/distributions/noncentralT.ts';
import { normalCdf, normalQuantile, normalUpperTail } from '../../../src/stats/distributions/normal.ts';
import {
  studentTCdf,
  studentTDensity,
  studentTQuantile,
  studentTUpperTail,
} from '../../../src/stats/distributions/studentT.ts';
import { relativeError } from '../../laws/relativeError.ts';

const seed = { seed: 1908, numRuns: 300 };
const between = (min: number, max: number): fc.Arbitrary<number> =>
  fc.double({ min, max, noNaN: true, noDefaultInfinity: true });
/** Spread evenly over powers of ten. */
const powers = (from: number, to: number): fc.Arbitrary<number> =>
  between(from, to).map((power) => 10 ** power);

// Tails are good to 1e-13, quantiles to 1e-13 on top of what rounding p does: a law about both may miss by 1e-12.
const law = 1e-12;

describe('normal', () => {
  it('quantile and tail undo each other', () => {
    fc.assert(
      fc.property(powers(-300, -0.31), (p) => {
        // moving z by one unit in its last place moves ln p by z² of them, up to 1,400
        expect(relativeError(normalCdf(normalQuantile(p)), p)).toBeLessThan(1e-12);
        expect(normalUpperTail(-normalQuantile(p))).toBe(normalCdf(normalQuantile(p)));
      }),
      seed,
    );
  });
});

describe('Student t', () => {
  it('quantile and tail undo each other', () => {
    fc.assert(
      fc.property(powers(-25, -0.301), powers(-1, 9), (p, nu) => {
        const t = studentTQuantile(p, nu);
        expect(relativeError(studentTCdf(t, nu), p)).toBeLessThan(law);
        expect(studentTQuantile(1 - 2 ** -20, nu)).toBe(-studentTQuantile(2 ** -20, nu));
      }),
      seed,
    );
  });

  it('both tails make one, and the tail falls', () => {
    fc.assert(
      fc.property(between(-60, 60), powers(-1, 9), (t, nu) => {
        expect(Math.abs(studentTCdf(t, nu) + studentTUpperTail(t, nu) - 1)).toBeLessThanOrEqual(
          Number.EPSILON,
        );
        expect(studentTUpperTail(t + 1e-3, nu)).toBeLessThanOrEqual(studentTUpperTail(t, nu));
      }),
      seed,
    );
  });

  it('the tail falls at the rate of the density', () => {
    fc.assert(
      fc.property(between(0.01, 8), powers(-0.3, 6), (t, nu) => {
        // a central difference over ±h misses by h²/6 of the third derivative and 1e-13/h of rounding
        const h = 1e-3;
        const rate = (studentTUpperTail(t - h, nu) - studentTUpperTail(t + h, nu)) / (2 * h);
        expect(relativeError(rate, studentTDensity(t, nu))).toBeLessThan(2e-4);
      }),
      seed,
    );
  });

  it('is continuous where one way of computing takes over from another', () => {
    // t² = nu parts power series and expansion; nu/2 = 16 the expansion and the recurrence
    for (const nu of [0.5, 3, 31, 32, 33, 400]) {
      const t = Math.sqrt(nu);
      expect(
        relativeError(studentTUpperTail(t * (1 - 1e-15), nu), studentTUpperTail(t * (1 + 1e-15), nu)),
      ).toBeLessThan(law);
    }
    for (const t of [0.1, 2, 5]) {
      expect(relativeError(studentTUpperTail(t, 32 - 1e-14), studentTUpperTail(t, 32))).toBeLessThan(law);
      expect(relativeError(studentTUpperTail(t, 1e20), studentTUpperTail(t, 0.99e20))).toBeLessThan(law);
    }
  });

  it('has its closed forms at one and two degrees of freedom', () => {
    // Cauchy: ½ − atan(t)/π; nu = 2: ½·(1 − t/√(2 + t²)), both well-conditioned below t = 2
    fc.assert(
      fc.property(between(0, 2), (t) => {
        expect(relativeError(studentTUpperTail(t, 1), 0.5 - Math.atan(t) / Math.PI)).toBeLessThan(1e-14);
        expect(relativeError(studentTUpperTail(t, 2), 0.5 * (1 - t / Math.sqrt(2 + t * t)))).toBeLessThan(
          1e-14,
        );
      }),
      seed,
    );
  });
});

describe('chi-square', () => {
  it('quantile and tail undo each other, from either side', () => {
    fc.assert(
      fc.property(powers(-30, -0.31), powers(-0.3, 4), (p, df) => {
        const lower = chiSquareQuantile(p, df);
        if (lower > 1e-290) expect(relativeError(chiSquareCdf(lower, df), p)).toBeLessThan(1e-11);
        expect(relativeError(chiSquareUpperTail(chiSquareUpperQuantile(p, df), df), p)).toBeLessThan(1e-11);
      }),
      seed,
    );
  });

  it('has its closed form at two degrees of freedom', () => {
    fc.assert(
      fc.property(powers(-10, 2.8), (x) => {
        // e^(−x/2): rounding of x/2 is x/2 units in the last place of the tail
        expect(relativeError(chiSquareUpperTail(x, 2), Math.exp(-x / 2))).toBeLessThan(law);
        expect(relativeError(chiSquareCdf(x, 2), -Math.expm1(-x / 2))).toBeLessThan(law);
      }),
      seed,
    );
  });

  it('with one degree of freedom is the square of a normal', () => {
    fc.assert(
      fc.property(between(0.01, 30), (z) => {
        expect(relativeError(chiSquareUpperTail(z * z, 1), 2 * normalUpperTail(z))).toBeLessThan(law);
      }),
      seed,
    );
  });
});

describe('beta and binomial', () => {
  const shape = powers(-0.3, 3.5);

  it('both tails make one, and mirror each other', () => {
    fc.assert(
      fc.property(between(0, 1), shape, shape, (x, a, b) => {
        expect(Math.abs(betaCdf(x, a, b) + betaUpperTail(x, a, b) - 1)).toBeLessThan(law);
        if (x >= 0.5) expect(betaUpperTail(x, a, b)).toBe(betaCdf(1 - x, b, a));
      }),
      seed,
    );
  });

  it('quantile and tail undo each other', () => {
    fc.assert(
      fc.property(powers(-20, -0.01), shape, shape, (p, a, b) => {
        const x = betaQuantile(p, a, b);
        const smaller = p < 0.5 ? [betaCdf(x, a, b), p] : [betaUpperTail(x, a, b), 1 - p];
        // one unit in the last place of x near 1 moves the upper tail by 1e-16·b/(1 − x)
        const room = law + (4e-16 * (a + b)) / Math.max(1 - x, Number.MIN_VALUE);
        if (x > 1e-290 && x < 1) expect(relativeError(smaller[0] ?? 0, smaller[1] ?? 0)).toBeLessThan(room);
      }),
      seed,
    );
  });

  it('masses add up to the tails', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 60 }), between(0, 1), (n, p) => {
        let below = 0;
        for (let k = 0; k <= n; k += 1) {
          below += binomialMass(k, n, p);
          expect(relativeError(binomialCdf(k, n, p), below)).toBeLessThan(law);
          expect(Math.abs(binomialUpperTail(k, n, p) + binomialCdf(k - 1, n, p) - 1)).toBeLessThan(law);
        }
        expect(Math.abs(below - 1)).toBeLessThan(law);
      }),
      { ...seed, numRuns: 60 },
    );
  });
});

describe('gamma functions', () => {
  it('follow Γ(x + 1) = x·Γ(x)', () => {
    fc.assert(
      fc.property(powers(-3, 6), (x) => {
        const step = logGamma(x + 1) - logGamma(x);
        expect(Math.abs(step - Math.log(x))).toBeLessThan(1e-14 * (1 + Math.abs(logGamma(x))));
      }),
      seed,
    );
  });

  it('two half steps make a whole one', () => {
    fc.assert(
      fc.property(powers(-2, 8), (nu) => {
        const twoHalves = logGammaDifference(nu).value + logGammaDifference(nu + 1).value;
        expect(Math.abs(twoHalves - Math.log(nu / 2))).toBeLessThan(1e-14 * (1 + Math.abs(Math.log(nu / 2))));
      }),
      seed,
    );
  });
});

describe('noncentral t', () => {
  it('falls as delta rises, and leads back to delta', () => {
    fc.assert(
      fc.property(between(-30, 30), powers(0, 3.7), between(-5, 5), (t, nu, away) => {
        const delta = t + away;
        const p = noncentralTCdf(t, nu, delta);
        expect(noncentralTCdf(t, nu, delta + 0.01)).toBeLessThan(p);
        expect(Math.abs(p + noncentralTUpperTail(t, nu, delta) - 1)).toBeLessThan(law);
        // in the upper half p has lost the digits of 1 − p; they are worth 1e-16/(1 − p) of delta's
        const back = noncentralityAt(p, t, nu);
        if (p < 0.99) expect(Math.abs(back - delta)).toBeLessThan(1e-11 * (1 + Math.abs(delta)));
      }),
      { ...seed, numRuns: 60 },
    );
  });

  it('with delta near 0 is Student’s t', () => {
    for (const [t, nu] of [
      [0.3, 2],
      [-2.5, 19],
      [6, 249],
    ] as const) {
      expect(relativeError(noncentralTCdf(t, nu, 1e-15), studentTCdf(t, nu))).toBeLessThan(1e-13);
    }
  });
});
