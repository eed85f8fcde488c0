import { blocksFaults } from './internal/blocks.ts';
import { kindOf, type Part, partsOf } from './internal/part.ts';
import { platformLimits } from './platformLimits.ts';

const limits = platformLimits.message;

/** A message as it is sent: the text of notifications and screen readers, and its blocks. */
export type Message = { readonly text: string; readonly blocks: readonly unknown[] };

/** Every text that stands somewhere in the blocks. */
const charactersIn = (value: unknown): number => {
  if (Array.isArray(value)) return value.reduce((sum: number, each: unknown) => sum + charactersIn(each), 0);
  if (typeof value !== 'object' || value === null) return 0;
  return Object.entries(value).reduce(
    (sum, [name, part]) =>
      sum + (typeof part === 'string' ? (name === 'text' ? part.length : 0) : charactersIn(part)),
    0,
  );
};

const tableCount = (blocks: readonly Part[]): number =>
  blocks.filter((block) => kindOf(block) === 'table').length;

/** How a message breaks the limits of the platform, a sentence each; empty where it keeps them all. */
export const limitFaults = ({ text, blocks }: Message): readonly string[] => {
  const parts = partsOf(blocks);
  const characters = charactersIn(parts);
  const tables = tableCount(parts);
  return [
    ...(text.trim() === '' ? ['the text for notifications is missing'] : []),
    ...(text.length > limits.textAdvised
      ? [`the text has ${text.length} characters, ${limits.textAdvised} at most`]
      : []),
    ...(parts.length < blocks.length ? ['a block is none'] : []),
    ...(tables > limits.tablesPerMessage ? [`${tables} tables, ${limits.tablesPerMessage} at most`] : []),
    ...(characters > limits.blocksTotalCharactersAdvised
      ? [`the blocks have ${characters} characters, ${limits.blocksTotalCharactersAdvised} at most`]
      : []),
    ...blocksFaults(parts, limits.blocks),
  ];
};
