import { z } from 'zod';
import limits from '../../fixtures/platform/limits.json' with { type: 'json' };

const richText = z.looseObject({
  type: z.literal('rich_text'),
  elements: z.array(
    z.looseObject({ type: z.string(), elements: z.array(z.looseObject({ type: z.string() })) }),
  ),
});

/** The typed cell kind raw_number is left out on purpose: the platform refuses it. */
const cell = z.union([
  z.strictObject({
    type: z.literal('raw_text'),
    text: z.string().min(limits.table.cellMinimumCharacters, 'must be more than 0 characters'),
  }),
  richText,
]);

export const tableBlock = z.strictObject({
  type: z.literal('table'),
  block_id: z.string().min(1).max(limits.ids.blockId).optional(),
  rows: z.array(z.array(cell).min(1).max(limits.table.columns)).min(1).max(limits.table.rows),
  column_settings: z
    .array(
      z.strictObject({
        align: z.enum(['left', 'center', 'right']).optional(),
        is_wrapped: z.boolean().optional(),
      }),
    )
    .max(limits.table.columns)
    .optional(),
});

type Table = z.infer<typeof tableBlock>;

const textOf = (element: Record<string, unknown>): string =>
  typeof element['text'] === 'string' ? element['text'] : '';

const cellText = (filled: Table['rows'][number][number]): string =>
  filled.type === 'raw_text'
    ? filled.text
    : filled.elements.flatMap((part) => part.elements.map(textOf)).join('');

const problemsOfOne = (table: Table): string[] => {
  const cells = table.rows.flat().map(cellText);
  const problems: string[] = [];
  if (new Set(table.rows.map((row) => row.length)).size > 1) problems.push('rows must have the same length');
  if (cells.some((text) => text.length < limits.table.cellMinimumCharacters))
    problems.push('cell must not be empty');
  if (cells.join('').length > limits.table.charactersAllCells) problems.push('table has too many characters');
  return problems;
};

export const tableProblems = (
  blocks: readonly { readonly type: string }[],
  place: 'message' | 'view',
): readonly string[] => {
  const tables = blocks.flatMap((block) => {
    const read = tableBlock.safeParse(block);
    return read.success ? [read.data] : [];
  });
  if (tables.length === 0) return [];
  if (place === 'view') return ['invalid_block_type table'];
  if (tables.length > limits.table.perMessage) return ['only_one_table_allowed'];
  return tables.flatMap(problemsOfOne);
};
