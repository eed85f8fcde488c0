import { expect, test } from 'vitest';
import { coverageTable } from '../../src/stats/coverage/table.ts';

const cellsOf = (interval: RegExp, process: string) =>
  coverageTable.filter(
    ([name, made, , level]) => interval.test(name) && made === process && level === '0.95',
  );

test('Student profile intervals hold the truth of independent t(4) returns within three points of 95%', () => {
  const cells = cellsOf(/^tail\.student\.var/, 'studentT4');
  expect(cells.length).toBe(12);
  for (const [, , , , coverage] of cells) expect(Math.abs(coverage - 0.95)).toBeLessThan(0.03);
  // With 20 returns the interval of ES is open above in four samples of ten, so it holds the truth more often than said.
  for (const [name, , count, , coverage] of cellsOf(/^tail\.student\.(es|nu)/, 'studentT4')) {
    expect(coverage).toBeGreaterThan(0.92);
    if (count > 20) expect(coverage, `${name} at ${count}`).toBeLessThan(0.98);
  }
});

test('the exact normal intervals hold the truth of normal returns, and rank intervals that of any independent ones', () => {
  // A share of 4,000 has a standard error of 0.0034 at 0.95; a point is three of them.
  const normal = cellsOf(/^tail\.normal/, 'normal');
  expect(normal.length).toBe(24);
  for (const [, , , , coverage] of normal) expect(Math.abs(coverage - 0.95)).toBeLessThan(0.01);
  for (const process of ['normal', 'studentT4'])
    for (const [, , , , coverage] of cellsOf(/^tail\.historical\.var/, process))
      expect(coverage).toBeGreaterThan(0.94);
});
