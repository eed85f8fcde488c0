import { describe, expect, it } from 'vitest';
import { andersonDarling } from '../../../src/stats/tails/andersonDarling.ts';
import { normalShapeOf } from '../../../src/stats/tails/internal/normalShape.ts';
import { studentDistance } from '../../../src/stats/tails/internal/studentDistance.ts';
import {
  normalTailOfAndersonDarling,
  studentTailOfAndersonDarling,
} from '../../../src/stats/tails/internal/symmetricTail.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { fixtureJson } from '../readFixture.ts';

type Handbook = {
  readonly cases: readonly {
    readonly name: string;
    readonly data?: readonly number[];
    readonly zarr13_adjusted_A2?: number;
  }[];
};

describe('The Anderson-Darling distance', () => {
  it('of a single value at the median is 2·ln 2 − 1', () => {
    expect(andersonDarling(Float64Array.of(0), normalTailOfAndersonDarling)).toBeCloseTo(
      2 * Math.LN2 - 1,
      15,
    );
  });

  it('agrees with the heat-flow data of the NIST handbook, recomputed with mpmath 1.2.1 (nist-handbook.json)', () => {
    const { cases } = fixtureJson<Handbook>('nist-handbook.json');
    const data = cases.find(({ name }) => name === 'confidence_limits_mean_zarr13')?.data ?? [];
    const expected = cases.find(({ name }) => name === 'anderson_darling_page_example')?.zarr13_adjusted_A2;
    const count = data.length;
    expect(count).toBe(195);
    const factor = 1 + 0.75 / count + 2.25 / (count * count);
    // A² is a small difference of sums near n: 195·1e-16 of rounding against 0.127
    const adjusted = factor * normalShapeOf(Float64Array.from(data)).andersonDarling;
    expect(relativeError(adjusted, expected ?? Number.NaN)).toBeLessThan(1e-11);
  });

  it('agrees on DAX with the definition summed from SciPy log tails', () => {
    // SciPy 1.17.1: norm.logcdf, norm.logsf, t.logcdf and t.logsf at the fitted parameters; the difference of sums near
    // n = 250 and 1859 leaves about n·1e-16 relative to A² in either program.
    const known = [
      {
        window: '250',
        normal: 0.788798864554991,
        student: 0.3361709878382442,
        nu: 8.085119600230746,
        location: 0.0016702558605346128,
        scale: 0.01280641510582662,
      },
      {
        window: 'all',
        normal: 12.768035819856095,
        student: 0.7921167403824256,
        nu: 4.215085162608148,
        location: 0.0007911127432746907,
        scale: 0.0075519610307155805,
      },
    ] as const;
    for (const { window, normal, student, nu, location, scale } of known) {
      const returns = indexReturns('DAX', window);
      expect(Math.abs(normalShapeOf(returns).andersonDarling - normal)).toBeLessThan(1e-10);
      expect(Math.abs(studentDistance(returns, { location, scale, nu }) - student)).toBeLessThan(1e-10);
    }
  });

  it('stays finite however far out a value lies', () => {
    const sample = Float64Array.of(-1, 0, 1, 60);
    const far = andersonDarling(sample, normalTailOfAndersonDarling);
    // ln of the normal tail at 60 is −1805.0136 (mpmath 1.3.0: log(erfc(60/sqrt(2))/2)); it enters with weight 1/n
    expect(normalTailOfAndersonDarling.farLogUpperTail(60)).toBeCloseTo(-1805.0135606, 6);
    expect(far).toBeGreaterThan(450);
    expect(Number.isFinite(far)).toBe(true);
    expect(
      Number.isFinite(andersonDarling(Float64Array.of(-1e9, 1e9), studentTailOfAndersonDarling(200))),
    ).toBe(true);
  });

  it('takes the normal tail for infinite nu', () => {
    expect(studentTailOfAndersonDarling(Number.POSITIVE_INFINITY)).toBe(normalTailOfAndersonDarling);
  });
});
