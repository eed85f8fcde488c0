import { describe, expect, test } from 'vitest';
import { stationaryBlockLength } from '../../../src/stats/bootstrap/blockLength.ts';
import { independentDraw } from '../../../src/stats/bootstrap/draws.ts';
import { endRanks } from '../../../src/stats/bootstrap/ranks.ts';
import { sortedReplicates } from '../../../src/stats/bootstrap/replicates.ts';
import { writeResampledMoments } from '../../../src/stats/bootstrap/resampledMoments.ts';
import { centre } from '../../../src/stats/moments/centre.ts';
import { sampleStandardDeviation } from '../../../src/stats/moments/deviation.ts';
import { arithmeticMean } from '../../../src/stats/moments/mean.ts';
import { simpleReturns } from '../../../src/stats/returns/returns.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { level } from '../levels.ts';
import { indexCloses } from '../readFixture.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(9);

describe('endRanks', () => {
  test.each([
    // By hand: (B + 1)·p with B + 1 = 10,000.
    ['0.95', 'both', 250, 9_750],
    ['0.95', 'above', 500, 9_500],
    ['0.999', 'both', 5, 9_995],
    ['0.975', 'both', 125, 9_875],
    ['0.9998', 'both', 1, 9_999],
    // 1.5 of a resample: rounded outward.
    ['0.9997', 'both', 1, 9_999],
  ] as const)('%s %s', (text, side, lower, upper) => {
    expect(accepted(endRanks(level(text), side, 9_999))).toEqual({ lower, upper });
  });

  test('no end can lie beyond the outermost resample', () => {
    expect(refusalCode(endRanks(level('0.99985'), 'both', 9_999))).toBe('levelOutside');
    expect(accepted(endRanks(level('0.99985'), 'below', 9_999))).toEqual({ lower: 1, upper: 9_999 });
  });
});

describe('writeResampledMoments', () => {
  const moments = new Float64Array(2);

  test('mean and deviation of what was picked', () => {
    const values = Float64Array.from([0.3, -1.2, 0.9, 2.2]);
    const picks = Uint32Array.from([1, 1, 3, 0]);
    writeResampledMoments(values, picks, moments);
    const picked = [-1.2, -1.2, 2.2, 0.3];
    // Few roundings of numbers near one.
    expect(relativeError(moments[0] ?? Number.NaN, arithmeticMean(picked))).toBeLessThan(1e-14);
    expect(relativeError(moments[1] ?? Number.NaN, sampleStandardDeviation(picked))).toBeLessThan(1e-14);
  });

  test('equal picks have a deviation of exactly 0', () => {
    writeResampledMoments(Float64Array.from([0.1, 5]), Uint32Array.from([0, 0, 0]), moments);
    expect(moments[1]).toBe(0);
  });

  test('picks that differ in the last digits keep their deviation', () => {
    const values = [1, 1 + 1e-9, 1 - 1e-9];
    writeResampledMoments(Float64Array.from(values), Uint32Array.from([0, 1, 2]), moments);
    // The values themselves are rounded at 1e-16, a ten-millionth of their spread.
    expect(relativeError(moments[1] ?? Number.NaN, 1e-9)).toBeLessThan(1e-6);
  });
});

describe('sortedReplicates', () => {
  const draws = [independentDraw(5)] as const;
  const sumOf = ([picks]: readonly [Uint32Array, ...Uint32Array[]]) =>
    picks.reduce((sum, pick) => sum + pick, 0);

  test('ascends, and replicate b depends on stream b alone', () => {
    const few = sortedReplicates({ draws, statistic: sumOf, streams, replicates: 50 });
    const single = Array.from({ length: 50 }, (_, replicate) =>
      sortedReplicates({
        draws,
        statistic: sumOf,
        streams: { stream: () => streams.stream(replicate) },
        replicates: 1,
      }),
    );
    expect([...few]).toEqual(single.map(([only]) => only).sort((a, b) => (a ?? 0) - (b ?? 0)));
  });

  test('a resample whose statistic does not exist is drawn again', () => {
    const onlyEven = (picks: readonly [Uint32Array, ...Uint32Array[]]) =>
      sumOf(picks) % 2 === 0 ? sumOf(picks) : Number.NaN;
    const sums = sortedReplicates({ draws, statistic: onlyEven, streams, replicates: 200 });
    expect(sums.every((sum) => sum % 2 === 0)).toBe(true);
  });

  test('a statistic that never exists is a bug', () => {
    expect(() =>
      sortedReplicates({ draws, statistic: () => Number.POSITIVE_INFINITY, streams, replicates: 1 }),
    ).toThrow(/does not exist in any resample/);
  });

  test('samples are drawn each on its own', () => {
    const two = [independentDraw(4), independentDraw(6)] as const;
    const lengths = new Set<string>();
    sortedReplicates({
      draws: two,
      statistic: ([first, second]) => {
        lengths.add(`${first.length} of ${second?.length}`);
        expect(Math.max(...(second ?? []))).toBeLessThan(6);
        return first[0] === second?.[0] ? 1 : 0;
      },
      streams,
      replicates: 100,
    });
    expect([...lengths]).toEqual(['4 of 6']);
  });
});

describe('stationaryBlockLength', () => {
  // The rule written out anew with numpy 2.4.6, on the last returns of the index and on their squared deviations.
  test.each([
    ['DAX', 10, 1.3465830699045314, 1],
    ['DAX', 20, 2.0188119481066273, 1],
    ['DAX', 60, 1, 1],
    ['DAX', 250, 1, 2.7992757496322644],
    ['DAX', 1859, 1, 9.68724114200329],
    ['SMI', 10, 2.1669089956341088, 1],
    ['SMI', 20, 1.574317087579586, 1.4424944924807672],
    ['SMI', 60, 1, 2.027726383169455],
    ['SMI', 250, 1.1321466698032965, 3.372301621565985],
    ['SMI', 1859, 2.4103109987753637, 9.372166226718766],
  ])('%s over %i returns', (ticker, count, plain, squared) => {
    const returns = simpleReturns(indexCloses(ticker).slice(-count - 1));
    const squares = centre(returns).deviations.map((deviation) => deviation ** 2);
    // numpy sums plainly, and the bandwidth sums cancel: 1e-10 relative.
    expect(relativeError(stationaryBlockLength(returns), plain)).toBeLessThan(1e-10);
    expect(relativeError(stationaryBlockLength(squares), squared)).toBeLessThan(1e-10);
  });

  test('a trend, by the same program', () => {
    const trend = Float64Array.from({ length: 60 }, (_, index) => index);
    expect(relativeError(stationaryBlockLength(trend), 10.518936368399437)).toBeLessThan(1e-10);
  });

  test.each([
    // By hand: ⌈min(3·√n, n/3)⌉ is ⌈10/3⌉, 60/3 and 3·√400.
    [10, 6, 4],
    [60, 12, 20],
    [400, 12, 60],
  ])('%i values in cycles of %i get the longest blocks allowed', (count, period, longest) => {
    const cycle = Float64Array.from({ length: count }, (_, index) =>
      Math.cos((2 * Math.PI * index) / period),
    );
    expect(stationaryBlockLength(cycle)).toBe(longest);
  });

  test('values that are all equal need no blocks', () => {
    expect(stationaryBlockLength(new Float64Array(12).fill(3))).toBe(1);
  });

  test('too few values throw', () => {
    expect(() => stationaryBlockLength([1, 2, 3])).toThrow(/at least 10 values, got 3/);
  });
});
