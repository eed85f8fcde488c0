import type { Delimiter } from '../../../terms/tableFormat.ts';

export const delimiterOf: Readonly<Record<Delimiter, string>> = { comma: ',', semicolon: ';', tab: '\t' };

/** The cells of one CSV record that stands on one line, white space around them taken off. */
export const cellsOfLine = (line: string, delimiter: string): string[] => {
  const cells: string[] = [];
  const cell = new RegExp(`(?:"((?:[^"]|"")*)"|([^${delimiter}]*))(${delimiter}|$)`, 'y');
  for (;;) {
    const found = cell.exec(line);
    if (found === null) return [line];
    cells.push((found[1]?.replaceAll('""', '"') ?? found[2] ?? '').trim());
    if (found[3] === '') return cells;
  }
};
