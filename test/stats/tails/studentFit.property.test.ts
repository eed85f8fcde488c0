import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nextStudentT } from '../../../src/stats/random/studentDraw.ts';
import { fitStudent } from '../../../src/stats/tails/studentFit.ts';
import { accepted } from '../../laws/outcomes.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(8);
const settings = { seed: 20_260_504, numRuns: 60 };

const sample = fc
  .record({
    stream: fc.nat(1_000_000),
    count: fc.integer({ min: 20, max: 300 }),
    nu: fc.constantFrom(0.7, 1, 2, 4, 10, Number.POSITIVE_INFINITY),
  })
  .map(({ stream, count, nu }) => {
    const random = streams.stream(stream);
    return Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, nu));
  });

const logDensity = (x: number, location: number, scale: number, nu: number): number => {
  const u = (x - location) / scale;
  return -0.5 * (nu + 1) * Math.log1p((u * u) / nu) - Math.log(scale);
};

describe('Laws of the Student fit', () => {
  it('always ends with finite figures inside the model', () => {
    fc.assert(
      fc.property(sample, (returns) => {
        const fit = accepted(fitStudent(returns));
        expect(Number.isFinite(fit.location) && Number.isFinite(fit.logLikelihood)).toBe(true);
        expect(fit.scale).toBeGreaterThan(0);
        expect(fit.nu).toBeGreaterThanOrEqual(0.5);
        expect(fit.logLikelihood).toBeGreaterThanOrEqual(fit.normalLogLikelihood - 1e-9);
      }),
      settings,
    );
  });

  it('follows a change of unit and a shift: nu stays, location and scale go along', () => {
    fc.assert(
      fc.property(
        sample,
        fc.constantFrom(0.001, 3, 100),
        fc.double({ min: -0.05, max: 0.05, noNaN: true }),
        (returns, factor, shift) => {
          const fit = accepted(fitStudent(returns));
          const moved = accepted(fitStudent(returns.map((value) => factor * (value + shift))));
          // Rounding of the shifted returns (1e-16 of 0.05 against a scale near 0.01) times the flatness of the
          // likelihood in 1/nu; two equally high maxima could part further and none of the samples has them.
          expect(Math.abs(1 / moved.nu - 1 / fit.nu)).toBeLessThan(1e-8);
          expect(Math.abs(moved.scale / (factor * fit.scale) - 1)).toBeLessThan(1e-8);
          expect(Math.abs(moved.location / factor - shift - fit.location)).toBeLessThan(1e-8 * fit.scale);
        },
      ),
      settings,
    );
  });

  it('mirrors with the returns and does not feel their order', () => {
    fc.assert(
      fc.property(sample, (returns) => {
        const fit = accepted(fitStudent(returns));
        const mirrored = accepted(fitStudent(returns.map((value) => -value).reverse()));
        expect(Math.abs(mirrored.location + fit.location)).toBeLessThan(1e-8 * fit.scale);
        expect(Math.abs(1 / mirrored.nu - 1 / fit.nu)).toBeLessThan(1e-8);
      }),
      settings,
    );
  });

  it('stands on a maximum: moving any parameter either way lowers the likelihood', () => {
    fc.assert(
      fc.property(sample, (returns) => {
        const fit = accepted(fitStudent(returns));
        if (fit.normalLimit || fit.nuOnBound) return;
        const at = (location: number, scale: number) => {
          let sum = 0;
          for (const x of returns) sum += logDensity(x, location, scale, fit.nu);
          return sum;
        };
        const best = at(fit.location, fit.scale);
        for (const step of [-1e-3, 1e-3]) {
          expect(at(fit.location + step * fit.scale, fit.scale)).toBeLessThan(best);
          expect(at(fit.location, fit.scale * (1 + step))).toBeLessThan(best);
        }
      }),
      settings,
    );
  });
});
