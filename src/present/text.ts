import type { Passage, Reply, Table } from './reply.ts';
import { furtherWarnings, shownWarnings } from './words.ts';

/** How wide the terminal is, in characters, and which number each button answers to. */
export type TextOptions = { readonly width: number; readonly firstButton?: number };

const narrowestWidth = 24;
const indent = '  ';
const columnGap = '  ';

const lengthOf = (text: string): number => [...text].length;

/** Splits a word that is longer than a line; whole words move to the next line. */
const pieces = (word: string, width: number): string[] => {
  const letters = [...word];
  const parts: string[] = [];
  for (let start = 0; start < letters.length; start += width)
    parts.push(letters.slice(start, start + width).join(''));
  return parts;
};

/** Lines of at most `width` characters; lines after the first are indented by `hanging`. */
export const wrap = (text: string, width: number, hanging = ''): string[] => {
  const lines: string[] = [];
  let line = '';
  const room = () => Math.max(1, width - (lines.length === 0 ? 0 : lengthOf(hanging)));
  const longestPiece = Math.max(1, width - lengthOf(hanging));
  for (const word of text.split(' ').flatMap((each) => pieces(each, longestPiece))) {
    const longer = line === '' ? word : `${line} ${word}`;
    if (lengthOf(longer) <= room()) line = longer;
    else {
      lines.push(line);
      line = word;
    }
  }
  lines.push(line);
  return lines.map((each, index) => (index === 0 ? each : `${hanging}${each}`));
};

const padded = (cell: string, width: number, align: 'left' | 'right'): string => {
  const room = ' '.repeat(Math.max(0, width - lengthOf(cell)));
  return align === 'left' ? `${cell}${room}` : `${room}${cell}`;
};

const columnWidths = ({ columns, rows }: Table): number[] =>
  columns.map(({ head }, index) =>
    Math.max(lengthOf(head), ...rows.map((row) => lengthOf(row[index] ?? ''))),
  );

const alignedTable = (table: Table, widths: readonly number[]): string[] => {
  const line = (cells: readonly string[]) =>
    table.columns
      .map(({ align }, index) => padded(cells[index] ?? '', widths[index] ?? 0, align))
      .join(columnGap)
      .trimEnd();
  return [table.columns.map(({ head }) => head), ...table.rows].map((cells) => `${indent}${line(cells)}`);
};

/** Where the table does not fit, each row becomes a sentence of its own. */
const stackedTable = ({ columns, rows }: Table, width: number): string[] =>
  rows.flatMap(([name = '', ...cells]) => {
    const parts = cells.map((cell, index) => `${columns[index + 1]?.head ?? ''} ${cell}`.trim());
    return wrap(`${name}: ${parts.join('; ')}`, width - indent.length, indent).map(
      (line) => `${indent}${line}`,
    );
  });

const tableLines = (table: Table, width: number): string[] => {
  const widths = columnWidths(table);
  const total =
    indent.length + widths.reduce((sum, each) => sum + each + columnGap.length, -columnGap.length);
  if (total <= width) return alignedTable(table, widths);
  const unit = table.columns[0]?.head ?? '';
  return [...(unit === '' ? [] : [`${indent}${unit}`]), ...stackedTable(table, width)];
};

const passageLines = ({ head, lines }: Passage, width: number): string[] => [
  ...(head === null ? [] : wrap(head, width)),
  ...lines.flatMap((line) =>
    wrap(line, width - indent.length, indent).map((each) => `${head === null ? '' : indent}${each}`),
  ),
];

/** The reply for a terminal: parts set apart by blank lines, no line longer than the width. */
export const toText = (reply: Reply, { width, firstButton = 1 }: TextOptions): string => {
  const room = Math.max(narrowestWidth, width);
  const inside = (text: string, mark = '') =>
    wrap(`${mark}${text}`, room - indent.length, ' '.repeat(lengthOf(mark))).map(
      (line) => `${indent}${line}`,
    );
  const further = furtherWarnings(reply);
  const parts: string[][] = [
    wrap(reply.sentence, room),
    reply.table === null ? [] : tableLines(reply.table, room),
    ...reply.passages.map((passage) => passageLines(passage, room)),
    [
      ...shownWarnings(reply).flatMap((warning) => inside(warning, 'Caution: ')),
      ...(further === null ? [] : inside(further)),
    ],
    [
      ...(reply.quietLine === null ? [] : inside(reply.quietLine)),
      ...(reply.caution === null ? [] : inside(reply.caution)),
      ...reply.buttons.flatMap(({ label }, index) => inside(`[${firstButton + index}] ${label}`)),
    ],
  ];
  return parts
    .filter((part) => part.length > 0)
    .map((part) => part.join('\n'))
    .join('\n\n');
};
