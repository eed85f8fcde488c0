import { writeFileSync } from 'node:fs';
import { describe, test } from 'vitest';
import type { RollingSizeCell } from '../../src/stats/coverage/rollingSizeCell.ts';
import { measureSize, type SizeProcess } from '../stats/backtests/rollingSize.ts';
import { level } from '../stats/levels.ts';
import { literal } from './suite.ts';

/** Apart from the histories that the slow test compares with. */
const firstHistory = 100_000;
const histories = 1_000;
const processes: readonly SizeProcess[] = ['normal', 'studentT4', 'garchT'];

const rounded = (value: number, places: number): number => Number(value.toFixed(places));

const sourceOf = (cells: readonly RollingSizeCell[]): string =>
  [
    "import type { RollingSizeCell } from '../rollingSizeCell.ts';",
    '',
    '/** Written by `npm run coverage-table`; not to be edited. */',
    'export const rollingSizeMeasured: readonly RollingSizeCell[] = [',
    ...cells.map((cell) => `  [${cell.map(literal).join(', ')}],`),
    '];',
    '',
  ].join('\n');

describe('rejections of rolling backtests', () => {
  test('at 99%, 250 days estimated on and 250 judged', () => {
    const cells = processes.flatMap((process) =>
      measureSize(process, level('0.99'), firstHistory, histories).map(
        ({ model, histories: judged, rate, kupiec }): RollingSizeCell => [
          process,
          model,
          judged,
          rounded(rate, 5),
          rounded(kupiec, 4),
        ],
      ),
    );
    const file = new URL('../../src/stats/coverage/measured/rollingSize.ts', import.meta.url);
    writeFileSync(file, sourceOf(cells));
  });
});
