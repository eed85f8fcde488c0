import { writeFileSync } from 'node:fs';
import { afterAll, describe, test } from 'vitest';
import type { CoverageCell, CoverageProcess } from '../../src/stats/coverage/cell.ts';
import { type Procedure, simulateCell } from './simulate.ts';

/** A plan of cells: which processes at which counts. */
export type Grid = readonly {
  readonly process: CoverageProcess;
  readonly counts: readonly number[];
}[];

/** The processes and counts at which every printed interval is measured. */
export const promisedGrid: Grid = (['normal', 'studentT4', 'garchT'] as const).map((process) => ({
  process,
  counts: [20, 60, 250, 1_000],
}));

export const replicationsPerCell = 4_000;

const literal = (value: string | number): string =>
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

const cellsOf = ({ procedures, grid, levels }: Suite) =>
  procedures.flatMap((procedure) =>
    grid.flatMap(({ process, counts }) =>
      counts.flatMap((count) => levels.map((level) => ({ procedure, process, count, level }))),
    ),
  );

/** Measures a suite, a test for each cell so that progress can be seen, and writes its file when all are done. */
export const measureSuite = (suite: Suite): void => {
  describe(`coverage of ${suite.name}`, () => {
    const measured: CoverageCell[] = [];
    const cells = cellsOf(suite);
    test.each(
      cells.map((cell) => [cell.procedure.name, cell.process, cell.count, cell.level, cell] as const),
    )('%s of %s returns, %i at %s', (_, __, ___, ____, cell) => {
      measured.push(simulateCell({ ...cell, replications: replicationsPerCell }));
    });
    afterAll(() => {
      if (measured.length < cells.length) return;
      // Where every sample was too short for the interval there is no share to report.
      const given = measured.filter(([, , , , , replications, refused]) => refused < replications);
      const file = new URL(`../../src/stats/coverage/measured/${suite.name}.ts`, import.meta.url);
      writeFileSync(file, sourceOf(`${suite.name}Coverage`, given));
    });
  });
};
