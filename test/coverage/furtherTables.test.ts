import { describe, expect, test } from 'vitest';
import type { CoverageCell } from '../../src/stats/coverage/cell.ts';
import { coverageTable } from '../../src/stats/coverage/table.ts';
import { beyondProcedures } from './beyondProcedures.ts';
import { comparisonProcedures } from './comparisonProcedures.ts';
import { deviationProcedures } from './deviationProcedures.ts';
import { meanProcedures } from './meanProcedures.ts';
import { simulateCell } from './simulate.ts';

const procedures = [...comparisonProcedures, ...beyondProcedures, ...deviationProcedures, ...meanProcedures];

const cellOf = (name: string, process: string, count: number, level: string): CoverageCell => {
  const found = coverageTable.find(
    ([interval, made, at, text]) => interval === name && made === process && at === count && text === level,
  );
  if (found === undefined) throw new Error(`the table has no ${name} of ${process} at ${count} and ${level}`);
  return found;
};

test.each([
  ['compare.welch.mean', 'garchT', 20, '0.95'],
  ['compare.paired.mean', 'studentT4', 60, '0.95'],
  ['beyond.historical.0.01', 'studentT4', 20, '0.95'],
  ['deviation.bonett', 'garchT', 20, '0.9'],
  ['mean.plain', 'normal', 20, '0.99'],
] as const)(
  'the table holds what the simulation of %s gives today: %s returns, %i at %s',
  (asked, made, at, text) => {
    const cell = cellOf(asked, made, at, text);
    const [name, process, count, level, , replications] = cell;
    const procedure = procedures.find((one) => one.name === name);
    if (procedure === undefined) throw new Error(`no procedure ${name}`);
    // Exact: the streams are seeded by the cell itself.
    expect(simulateCell({ procedure, process, count, level, replications })).toEqual(cell);
  },
);

/** Four standard errors of a share at its level. */
const allowance = (level: number, replications: number): number =>
  4 * Math.sqrt((level * (1 - level)) / replications);

describe('intervals that are exact hold the truth as often as they say', () => {
  test.each([
    ['compare.paired.mean', 'normal', 0.95],
    ['mean.plain', 'normal', 0.9],
    ['mean.plain', 'normal', 0.99],
    ['deviation.chiSquare', 'normal', 0.9],
    ['deviation.chiSquare', 'normal', 0.99],
    ['beyond.normal.0.05', 'normal', 0.95],
    ['beyond.normal.0.01', 'normal', 0.95],
  ] as const)('%s of %s returns at %d', (name, process, level) => {
    const cells = coverageTable.filter(
      ([interval, made, , text]) => interval === name && made === process && Number(text) === level,
    );
    expect(cells.length).toBeGreaterThan(2);
    for (const [, , , , coverage, replications] of cells)
      expect(Math.abs(coverage - level)).toBeLessThan(allowance(level, replications));
  });

  test('Clopper and Pearson’s never hold it less often, whatever the independent returns are', () => {
    const cells = coverageTable.filter(
      ([interval, made]) => interval.startsWith('beyond.historical') && made !== 'garchT',
    );
    expect(cells.length).toBeGreaterThan(7);
    for (const [, , , , coverage, replications] of cells)
      expect(coverage).toBeGreaterThan(0.95 - allowance(0.95, replications));
  });
});

test('GARCH-filtered VaR holds the next day’s figure of GARCH returns within five points of 95%', () => {
  const cells = coverageTable.filter(
    ([interval, made, count]) =>
      interval.startsWith('tail.filtered.var') && made === 'garchT' && count >= 500,
  );
  expect(cells.length).toBe(6);
  for (const [, , , , coverage] of cells) expect(Math.abs(coverage - 0.95)).toBeLessThan(0.05);
});
