import { describe, expect, test } from 'vitest';
import { bcaInterval } from '../../../src/stats/bootstrap/bca.ts';
import { independentDraw } from '../../../src/stats/bootstrap/draws.ts';
import {
  type Picks,
  type ResampledStatistic,
  sortedReplicates,
} from '../../../src/stats/bootstrap/replicates.ts';
import { writeResampledMoments } from '../../../src/stats/bootstrap/resampledMoments.ts';
import { normalCdf } from '../../../src/stats/distributions/normal.ts';
import { centre } from '../../../src/stats/moments/centre.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { indexReturns } from '../indexWindows.ts';
import { level, level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(11);
const dax = centre(indexReturns('DAX', '60')).deviations;
const smi = centre(indexReturns('SMI', '60')).deviations;

/** ln(s1/s2); paired where one array of picks serves both. */
const logRatio = (first: Float64Array, second: Float64Array): ResampledStatistic => {
  const moments = new Float64Array(2);
  const deviation = (values: Float64Array, picks: Uint32Array): number => {
    writeResampledMoments(values, picks, moments);
    return moments[1] ?? Number.NaN;
  };
  return ([ofFirst, ofSecond = ofFirst]: Picks) =>
    Math.log(deviation(first, ofFirst) / deviation(second, ofSecond));
};

describe('ratio of two standard deviations', () => {
  // Estimate and acceleration: the formulas written out anew with numpy 2.4.6 (np.delete jackknife); 1e-9 relative, for
  // the acceleration is a small remainder of cubes. Ends: scipy 1.17.1, stats.bootstrap(method='BCa'), 200,000 resamples,
  // two seeds that agree to 0.002; four standard errors of an end at 9,999 resamples are 0.009 paired, 0.015 unpaired.
  test('dates drawn in pairs', () => {
    const found = accepted(
      bcaInterval({ counts: [60], statistic: logRatio(dax, smi), level: level95, streams }),
    );
    expect(relativeError(found.estimate, 0.04288189581328556)).toBeLessThan(1e-12);
    expect(relativeError(found.acceleration, 0.017296330274191522)).toBeLessThan(1e-9);
    expect(Math.abs(found.lower - -0.0967)).toBeLessThan(0.009);
    expect(Math.abs(found.upper - 0.2137)).toBeLessThan(0.009);
  });

  test('two periods drawn each on its own', () => {
    const shorter = indexReturns('SMI', '60').slice(0, 45);
    const statistic = logRatio(dax, centre(shorter).deviations);
    const found = accepted(bcaInterval({ counts: [60, 45], statistic, level: level95, streams }));
    expect(relativeError(found.estimate, 0.29823215424956234)).toBeLessThan(1e-12);
    expect(relativeError(found.acceleration, -0.0007124580719182971)).toBeLessThan(1e-9);
    expect(Math.abs(found.lower - 0.0246)).toBeLessThan(0.015);
    expect(Math.abs(found.upper - 0.5612)).toBeLessThan(0.015);
  });

  test('exchanging the samples mirrors the interval', () => {
    const there = accepted(
      bcaInterval({ counts: [60], statistic: logRatio(dax, smi), level: level95, streams }),
    );
    const back = accepted(
      bcaInterval({ counts: [60], statistic: logRatio(smi, dax), level: level95, streams }),
    );
    // The same resamples with the sign turned, so only rounding differs.
    expect(relativeError(back.lower, -there.upper)).toBeLessThan(1e-12);
    expect(relativeError(back.upper, -there.lower)).toBeLessThan(1e-12);
    expect(relativeError(back.biasCorrection, -there.biasCorrection)).toBeLessThan(1e-12);
  });
});

describe('bias and acceleration', () => {
  test('move the ends to other ranks of the same resamples', () => {
    // A mean of squares is lopsided enough for both corrections to move the ends by many ranks.
    const values = [1, 2, 4, 8, 9, 12, 13, 17, 18, 30];
    const statistic: ResampledStatistic = ([picks]) =>
      picks.reduce((sum, pick) => sum + (values[pick] ?? Number.NaN) ** 2, 0) / picks.length;
    const found = accepted(bcaInterval({ counts: [10], statistic, level: level95, streams }));
    const sorted = sortedReplicates({ draws: [independentDraw(10)], statistic, streams, replicates: 9_999 });
    const { biasCorrection: z0, acceleration: a } = found;
    // Efron 1987, written out anew: the share of the resamples below each end. 1.95996… is the 97.5% normal quantile.
    const shareBelow = (z: number) => normalCdf(z0 + (z0 + z) / (1 - a * (z0 + z)));
    expect(z0).toBeGreaterThan(0.02);
    expect(a).toBeGreaterThan(0.05);
    expect(found.lower).toBe(sorted[Math.floor(10_000 * shareBelow(-1.959963984540054)) - 1]);
    expect(found.upper).toBe(sorted[9_999 - Math.floor(10_000 * (1 - shareBelow(1.959963984540054)))]);
  });
});

describe('refusals', () => {
  test('a level that the resamples cannot reach', () => {
    const statistic = logRatio(dax, smi);
    const asked = { counts: [60], statistic, streams, replicates: 99 } as const;
    expect(refusalCode(bcaInterval({ ...asked, level: level('0.999') }))).toBe('levelOutside');
    expect(accepted(bcaInterval({ ...asked, level: level('0.8') })).estimate).toBeGreaterThan(0);
  });

  test.each([-1e6, 1e6])('resamples that all lie on one side of an estimate of %d', (estimate) => {
    const statistic: ResampledStatistic = ([picks]) =>
      picks.length === 12 && picks.every((pick, place) => pick === place) ? estimate : Math.max(...picks);
    const asked = { counts: [12], statistic, level: level95, streams, replicates: 99 } as const;
    expect(refusalCode(bcaInterval(asked))).toBe('resamplesUnusable');
  });

  test('a statistic that does not exist when one value is left out', () => {
    const needsAll: ResampledStatistic = ([picks]) => (picks.length < 12 ? Number.NaN : Math.max(...picks));
    expect(refusalCode(bcaInterval({ counts: [12], statistic: needsAll, level: level95, streams }))).toBe(
      'resamplesUnusable',
    );
  });
});
