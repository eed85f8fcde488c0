import { writeFileSync } from 'node:fs';
import { afterAll, describe, test } from 'vitest';
import type { CoverageCell, CoverageProcess } from '../../src/stats/coverage/cell.ts';
import { type Procedure, simulateCells } from './simulate.ts';

/** A plan of cells: which processes at which counts, and how many samples where the usual number is not affordable. */
export type Grid = readonly {
  readonly process: CoverageProcess;
  readonly counts: readonly number[];
  readonly replications?: number;
}[];

/** The processes and counts at which every printed interval is measured. */
export const promisedGrid: Grid = (['normal', 'studentT4', 'garchT'] as const).map((process) => ({
  process,
  counts: [20, 60, 250, 1_000],
}));

export const replicationsPerCell = 4_000;

export const literal = (value: string | number): string =>
  typeof value === 'string' ? `'${value}'` : String(value);

/** The source text of one file under src/stats/coverage/measured. */
export const sourceOf = (constant: string, cells: readonly CoverageCell[]): string =>
  [
    "import type { CoverageCell } from '../cell.ts';",
    '',
    '/** Written by `npm run coverage-table`; not to be edited. */',
    `export const ${constant}: readonly CoverageCell[] = [`,
    ...cells.map((cell) => `  [${cell.map(literal).join(', ')}],`),
    '];',
    '',
  ].join('\n');

export type Suite = {
  /** File under src/stats/coverage/measured and, with `Coverage` behind it, the constant in it. */
  readonly name: string;
  readonly procedures: readonly Procedure[];
  readonly grid: Grid;
  readonly levels: readonly string[];
};

/** Measures a suite, a test for each process and count so that progress can be seen, and writes its file when all are done. */
export const measureSuite = (suite: Suite): void => {
  const { procedures, grid, levels } = suite;
  describe(`coverage of ${suite.name}`, () => {
    const settings = grid.flatMap(({ process, counts, replications = replicationsPerCell }) =>
      counts.map((count) => [process, count, { process, count, replications }] as const),
    );
    const measured: CoverageCell[] = [];
    test.each(settings)('%s returns, %i', (_, __, setting) => {
      measured.push(...simulateCells(procedures, levels, setting));
    });
    afterAll(() => {
      if (measured.length < settings.length * procedures.length * levels.length) return;
      // Where every sample was too short for the interval there is no share to report.
      const given = procedures.flatMap(({ name }) =>
        measured.filter(([cell, , , , , made, refused]) => cell === name && refused < made),
      );
      const file = new URL(`../../src/stats/coverage/measured/${suite.name}.ts`, import.meta.url);
      writeFileSync(file, sourceOf(`${suite.name}Coverage`, given));
    });
  });
};
