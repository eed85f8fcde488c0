import { expect, test } from 'vitest';
import { plainMean } from './meanProcedures.ts';
import { simulateCell } from './simulate.ts';

test('the plain 95% interval of ten normal returns holds the true mean 95% of the time', () => {
  const [, , , , coverage, replications, refused] = simulateCell({
    procedure: plainMean,
    process: 'normal',
    count: 10,
    level: '0.95',
    replications: 20_000,
  });
  // Exact by theory (Student 1908). A share of 20,000 has a standard error of 0.0015; half a point is three of them.
  expect(Math.abs(coverage - 0.95)).toBeLessThan(0.005);
  expect([replications, refused]).toEqual([20_000, 0]);
});
