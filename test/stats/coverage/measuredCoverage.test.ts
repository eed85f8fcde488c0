import { describe, expect, test } from 'vitest';
import type { CoveredInterval } from '../../../src/stats/coverage/cell.ts';
import { measuredCoverage } from '../../../src/stats/coverage/measuredCoverage.ts';
import { coverageProcessFor } from '../../../src/stats/coverage/process.ts';
import { coverageTable } from '../../../src/stats/coverage/table.ts';
import { level, level95 } from '../levels.ts';

const asked = { interval: 'mean.plain', process: 'normal', level: level95 } as const;

describe('measuredCoverage', () => {
  test.each([
    [20, 20],
    // Between 60 and 250 the middle on the scale of ratios is √(60·250) = 122.5.
    [122, 60],
    [123, 250],
    [5_000, 1_000],
    [2, 10],
  ])('%i returns are answered from %i', (count, nearest) => {
    expect(measuredCoverage({ ...asked, count })?.count).toBe(nearest);
  });

  test('is the cell of the table', () => {
    const found = measuredCoverage({ ...asked, count: 60 });
    const cell = coverageTable.find(
      ([interval, process, count]) => interval === 'mean.plain' && process === 'normal' && count === 60,
    );
    expect([found?.coverage, found?.replications]).toEqual([cell?.[4], cell?.[5]]);
  });

  test('says when a level is missed by more than three points', () => {
    expect(measuredCoverage({ ...asked, count: 60 })?.misses).toBe(false);
    const onClusters = { interval: 'deviation.chiSquare', process: 'garchT', level: level95 } as const;
    expect(measuredCoverage({ ...onClusters, count: 250 })?.misses).toBe(true);
  });

  test('what was not measured is null', () => {
    expect(measuredCoverage({ ...asked, count: 60, level: level('0.97') })).toBeNull();
    expect(
      measuredCoverage({ ...asked, interval: 'deviation.block', process: 'exponential', count: 60 }),
    ).toBeNull();
  });
});

describe('the table', () => {
  const promised = ['normal', 'studentT4', 'garchT'] as const;
  const intervals: readonly CoveredInterval[] = [
    'mean.plain',
    'mean.normal',
    'mean.neweyWest',
    'mean.studentised',
    'mean.stationary',
    'mean.trusted',
    'mean.prediction',
    'deviation.chiSquare',
    'deviation.bonett',
    'deviation.block',
    'deviation.trusted',
    'ratio.noncentralT',
  ];

  test.each(intervals)('%s has every promised cell, of 4,000 samples at least', (interval) => {
    const cells = coverageTable.filter(
      ([name, process]) => name === interval && process !== 'autoregressive',
    );
    for (const process of promised)
      for (const count of [20, 60, 250, 1_000]) {
        const cell = cells.find((one) => one[1] === process && one[2] === count && one[3] === '0.95');
        expect(cell?.[5]).toBeGreaterThanOrEqual(4_000);
      }
  });

  test('shares are shares, and no cell stands twice', () => {
    for (const [, , , , coverage, replications, refused] of coverageTable) {
      expect(coverage).toBeGreaterThanOrEqual(0);
      expect(coverage).toBeLessThanOrEqual(1);
      expect(refused).toBeLessThan(replications);
    }
    const keys = coverageTable.map((cell) => cell.slice(0, 4).join(' '));
    expect(new Set(keys).size).toBe(keys.length);
  });
});

describe('coverageProcessFor', () => {
  test.each([
    [false, false, false, 'normal'],
    [false, false, true, 'studentT4'],
    [true, false, true, 'autoregressive'],
    [true, true, true, 'garchT'],
    [false, true, false, 'garchT'],
  ])('dependent %s, clustered %s, fat-tailed %s: %s', (dependent, clustered, fatTailed, process) => {
    expect(coverageProcessFor({ dependent, clustered, fatTailed })).toBe(process);
  });
});
