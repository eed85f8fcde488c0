import { platformLimits } from '../platformLimits.ts';
import { countFaults, kindOf, type Part, partsOf, wordsIn } from './part.ts';

const limits = platformLimits.table;
const cellTypes: readonly string[] = limits.cellTypes;

/** The words of a cell: of a rich one those of all its parts. */
const cellText = (cell: Part): string =>
  wordsIn(cell) ??
  partsOf(cell['elements'])
    .flatMap((part) => partsOf(part['elements']))
    .map((part) => wordsIn(part) ?? '')
    .join('');

/** What is wrong with a table: its size, the length of its rows, its cells. */
export const tableFaults = (table: Part, where: string): readonly string[] => {
  const rows: readonly unknown[] = Array.isArray(table['rows']) ? table['rows'] : [];
  const cells = rows.flatMap(partsOf);
  const texts = cells.map(cellText);
  const characters = texts.reduce((sum, text) => sum + text.length, 0);
  const lengths = new Set(rows.map((row) => partsOf(row).length));
  return [
    ...countFaults(`${where} rows`, rows, limits.rows),
    ...rows.flatMap((row, index) => countFaults(`${where} row ${index + 1}`, row, limits.columns)),
    ...(lengths.size > 1 ? [`${where} has rows of different lengths`] : []),
    ...(texts.some((text) => text.length < limits.cellMinimumCharacters)
      ? [`${where} has an empty cell`]
      : []),
    ...(cells.some((cell) => !cellTypes.includes(kindOf(cell)))
      ? [`${where} has a cell of another kind`]
      : []),
    ...(characters > limits.charactersAllCells ? [`${where} has ${characters} characters`] : []),
  ];
};
