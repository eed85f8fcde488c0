import { describe, expect, test } from 'vitest';
import { bcaInterval } from '../../../src/stats/bootstrap/bca.ts';
import type { ResampledStatistic } from '../../../src/stats/bootstrap/replicates.ts';
import { normalQuantile } from '../../../src/stats/distributions/normal.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { level } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(12);
const oneToNineteen = Array.from({ length: 19 }, (_, index) => index + 1);

/** A statistic that ignores its picks: the estimate first, then the leave-one-out values, then the replicates. */
const scripted = (
  estimate: number,
  leftOut: readonly number[],
  replicates: readonly number[],
): ResampledStatistic => {
  const answers = [estimate, ...leftOut, ...replicates];
  let calls = 0;
  return () => {
    calls += 1;
    return answers[calls - 1] ?? Number.NaN;
  };
};

const intervalOf = (estimate: number, confidence: string, leftOut: readonly number[] = [0, 0]) =>
  bcaInterval({
    counts: [leftOut.length],
    statistic: scripted(estimate, leftOut, oneToNineteen),
    level: level(confidence),
    streams,
    replicates: 19,
  });

describe('ranks among the replicates 1 to 19, by hand', () => {
  test('without bias or acceleration 20·5% is the first and the last', () => {
    // Nine of 19 lie below 10 and one equals it: 9.5/19 is a half, so z0 is 0.
    expect(accepted(intervalOf(10, '0.9'))).toEqual({
      estimate: 10,
      lower: 1,
      upper: 19,
      biasCorrection: expect.closeTo(0, 12),
      acceleration: 0,
    });
    expect(accepted(intervalOf(10, '0.8'))).toMatchObject({ lower: 2, upper: 18 });
  });

  test('a replicate equal to the estimate counts half', () => {
    expect(accepted(intervalOf(12, '0.5')).biasCorrection).toBe(normalQuantile(11.5 / 19));
    expect(accepted(intervalOf(12.5, '0.5')).biasCorrection).toBe(normalQuantile(12 / 19));
  });

  test('an end beyond the outermost replicate on either side or both is refused', () => {
    // z0 = Φ⁻¹(2.5/19) = −1.12 reads the lower end at Φ(−2.24 − 1.64), below 1 of 20, and the upper one well inside.
    for (const estimate of [3, 10, 17])
      expect(refusalCode(intervalOf(estimate, estimate === 10 ? '0.91' : '0.9'))).toBe('levelOutside');
  });
});

describe('a correction that leaves its range', () => {
  // One value of 100 decides: |a| = 98/(6·√(100·99)) = 0.164, and 1 − 0.164·6.47 is below 0 (6.47 from a tail of 5e-11).
  test.each([-1, 1])('is refused on the side it concerns: %d', (outlier) => {
    const leftOut = Array.from({ length: 100 }, (_, index) => (index === 0 ? outlier : 0));
    expect(intervalOf(10, '0.9999999999', leftOut)).toEqual({
      ok: false,
      problem: expect.objectContaining({
        code: 'resamplesUnusable',
        message:
          'The resamples do not surround the estimate, so that no interval can be read from them: a few returns decide the whole figure. Ask for a longer window.',
      }),
    });
    expect(Math.abs(accepted(intervalOf(10, '0.5', leftOut)).acceleration)).toBeCloseTo(
      98 / (6 * Math.sqrt(9_900)),
      12,
    );
  });
});
