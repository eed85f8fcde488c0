/** Seeded edits of a good price file, of the kinds that disks, spreadsheets and programs make. */
export type Chance = {
  readonly below: (count: number) => number;
  readonly one: <Item>(items: readonly Item[]) => Item;
};

/** Marsaglia's xorshift on 32 bits (2003). */
export const makeChance = (seed: number): Chance => {
  let state = (seed * 2_654_435_761 + 1) >>> 0 || 1;
  const below = (count: number): number => {
    state ^= state << 13;
    state >>>= 0;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return Math.floor((state / 4_294_967_296) * count);
  };
  const one = <Item>(items: readonly Item[]): Item => items[below(items.length)] as Item;
  return { below, one };
};

type Edit = (bytes: Buffer, chance: Chance) => Buffer;

const onText =
  (edit: (text: string, chance: Chance) => string): Edit =>
  (bytes, chance) =>
    Buffer.from(edit(bytes.toString('latin1'), chance), 'latin1');

const onLines = (edit: (lines: string[], chance: Chance) => string[]): Edit =>
  onText((text, chance) => edit(text.split('\n'), chance).join('\n'));

/** A line that holds a row, or the row of names where the file has no other. */
const anyLine = (lines: readonly string[], chance: Chance): number =>
  chance.below(Math.max(lines.length - 1, 1));

const onCell = (replace: (cell: string, chance: Chance) => string, column: number): Edit =>
  onLines((lines, chance) => {
    const at = anyLine(lines, chance);
    const cells = (lines[at] ?? '').split(',');
    const place = Math.min(column, cells.length - 1);
    cells[place] = replace(cells[place] ?? '', chance);
    return lines.with(at, cells.join(','));
  });

const prices = [
  '',
  '0',
  '-5',
  '-0',
  'NaN',
  'inf',
  '-inf',
  '1e308',
  '1e-308',
  '1e999',
  '5e-324',
  '1_000',
  '0x1F',
  '1,5',
  ' 5 ',
  '+5',
  '.5',
  '5.',
  '1e2',
  'null',
  'N/A',
  '#REF!',
  'true',
  '12abc',
  '٣',
  '1 000',
  '$5',
  '5%',
  '--5',
  '1.2.3',
  '9'.repeat(400),
  '"5"',
  '"5',
  '5"',
  '""',
  '1;5',
  '5\t',
];
const dates = [
  '',
  '0000-01-01',
  '0001-01-01',
  '9999-12-31',
  '10000-01-01',
  '-2026-01-05',
  '2026-02-30',
  '2026-13-01',
  '05/01/2026',
  '1/5/2026',
  '2026-1-5',
  '2026/01/05',
  '20260105',
  '46027',
  '2026-01-05 00:00:00',
  '2026-01-05T00:00:00Z',
  ' 2026-01-05',
  'infinity',
  'epoch',
  'today',
  '2026-01-10',
  '2027-01-04',
  '"2026-01-05"',
  '"2026',
];
const names = [
  '',
  ' ',
  'kelp',
  'KELP ',
  'NEW',
  '"',
  '"KELP"',
  'KE"LP',
  'KE\0LP',
  'x'.repeat(60),
  '=1+1',
  'K\u00e9',
  '-',
  'NULL',
];

const swap = (lines: string[], chance: Chance): string[] => {
  const [first, second] = [anyLine(lines, chance), anyLine(lines, chance)];
  return lines.with(first, lines[second] ?? '').with(second, lines[first] ?? '');
};

/** Every kind of edit by its name, so that a failure says what was done. */
export const edits: Readonly<Record<string, Edit>> = {
  flipBit: (bytes, chance) => {
    const copy = Buffer.from(bytes);
    const at = chance.below(copy.length);
    if (copy.length > 0) copy[at] = (copy[at] ?? 0) ^ (1 << chance.below(8));
    return copy;
  },
  setByte: (bytes, chance) => {
    const copy = Buffer.from(bytes);
    if (copy.length > 0)
      copy[chance.below(copy.length)] = chance.one([0, 10, 13, 34, 39, 44, 46, 45, 48, 57, 127, 128, 255]);
    return copy;
  },
  insertByte: (bytes, chance) => {
    const at = chance.below(bytes.length + 1);
    return Buffer.concat([bytes.subarray(0, at), Buffer.from([chance.below(256)]), bytes.subarray(at)]);
  },
  deleteBytes: (bytes, chance) => {
    const at = chance.below(bytes.length + 1);
    return Buffer.concat([bytes.subarray(0, at), bytes.subarray(at + 1 + chance.below(40))]);
  },
  truncate: (bytes, chance) => bytes.subarray(0, chance.below(bytes.length + 1)),
  truncateEnd: (bytes, chance) => bytes.subarray(0, Math.max(bytes.length - 1 - chance.below(12), 0)),
  repeatPart: (bytes, chance) => {
    const at = chance.below(bytes.length + 1);
    return Buffer.concat([bytes, bytes.subarray(at, at + chance.below(200))]);
  },
  price: onCell((_, chance) => chance.one(prices), 2),
  date: onCell((_, chance) => chance.one(dates), 0),
  name: onCell((_, chance) => chance.one(names), 1),
  scalePrice: onCell(
    (cell, chance) => String(Number(cell) * chance.one([0.001, 0.01, 0.1, 0.5, 2, 10, 100, 1000])),
    2,
  ),
  quoteCell: (bytes, chance) => onCell((cell) => `"${cell}"`, chance.below(3))(bytes, chance),
  dropRow: onLines((lines, chance) => lines.toSpliced(anyLine(lines, chance), 1)),
  dropRows: onLines((lines, chance) => lines.toSpliced(anyLine(lines, chance), 1 + chance.below(60))),
  repeatRow: onLines((lines, chance) =>
    lines.toSpliced(anyLine(lines, chance), 0, lines[anyLine(lines, chance)] ?? ''),
  ),
  blankRow: onLines((lines, chance) =>
    lines.toSpliced(anyLine(lines, chance), 0, chance.one(['', ',,', ' ', ', ,'])),
  ),
  swapRows: onLines(swap),
  reverseRows: onLines((lines) => [lines[0] ?? '', ...lines.slice(1, -1).reverse(), '']),
  shortRow: onLines((lines, chance) => {
    const at = anyLine(lines, chance);
    return lines.with(at, (lines[at] ?? '').replace(/,[^,]*$/, ''));
  }),
  longRow: onLines((lines, chance) => {
    const at = anyLine(lines, chance);
    return lines.with(at, `${lines[at]},${chance.one(['', '1', 'x'])}`);
  }),
  reorderColumns: onLines((lines) => lines.map((line) => line.split(',').reverse().join(','))),
  dropColumn: (bytes, chance) => {
    const column = chance.below(3);
    return onLines((lines) => lines.map((line) => line.split(',').toSpliced(column, 1).join(',')))(
      bytes,
      chance,
    );
  },
  addColumn: onLines((lines) =>
    lines.map((line, at) => (line === '' ? line : `${line},${at === 0 ? 'note' : 'x'}`)),
  ),
  delimiter: onText((text, chance) => text.replaceAll(',', chance.one([';', '\t', '|', ', ']))),
  lineEnds: onText((text, chance) => text.replaceAll('\n', chance.one(['\r\n', '\r', '\n\n']))),
  someLineEnds: onText((text, chance) => {
    const from = chance.below(text.length + 1);
    return text.slice(0, from) + text.slice(from).replace('\n', chance.one(['\r\n', '\r']));
  }),
  byteOrderMark: (bytes) => Buffer.concat([Buffer.from([0xef, 0xbb, 0xbf]), bytes]),
  utf16: (bytes) => Buffer.from(`\ufeff${bytes.toString('latin1')}`, 'utf16le'),
  nullBytes: (bytes, chance) =>
    Buffer.concat([bytes.subarray(0, chance.below(bytes.length + 1)), Buffer.alloc(1 + chance.below(600))]),
  notUtf8: (bytes, chance) => {
    const at = chance.below(bytes.length + 1);
    return Buffer.concat([bytes.subarray(0, at), Buffer.from([0xe9, 0x20, 0xff]), bytes.subarray(at)]);
  },
  decimalComma: onText((text) => text.replaceAll('.', ',')),
  upperCase: onText((text) => text.toUpperCase()),
};

/** So rare that it is no part of the ordinary lot: a row of ten million bytes. */
export const hugeLine: Edit = onLines((lines, chance) =>
  lines.toSpliced(anyLine(lines, chance), 0, 'x'.repeat(10_000_000)),
);

const editNames = Object.keys(edits);

/** One to three edits of a file, with the names of them. */
export const editedFile = (good: Buffer, seed: number): { bytes: Buffer; done: readonly string[] } => {
  const chance = makeChance(seed);
  const done = Array.from({ length: 1 + chance.below(3) }, () => chance.one(editNames));
  return { bytes: done.reduce((bytes, name) => edits[name]?.(bytes, chance) ?? bytes, good), done };
};
