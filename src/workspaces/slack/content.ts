import type { Block } from './ports.ts';
import type { Outcome } from './wire.ts';

export type Content = { readonly text: string; readonly blocks: readonly Block[] };

/** Nothing in a message is read as markup, a name or a link to be opened up unless its blocks say so. */
export const plainly = {
  parse: 'none',
  link_names: false,
  unfurl_links: false,
  unfurl_media: false,
} as const;

export const textAlone = ({ text }: Content): Content => ({ text, blocks: [] });

/** Whether the looks of the message were refused, not the message. */
export const looksRefused = (outcome: Outcome, content: Content): boolean =>
  outcome.kind === 'refused' && outcome.code.startsWith('invalid_blocks') && content.blocks.length > 0;

/** The platform looks at an uploaded file for a while; until then it refuses what shows it. */
const fileProcessingMs = 5_000;
export const fileProcessingPauseMs = 1_000;

/** Whether the refusal may only mean that the file is not ready yet. */
export const awaitsFile = (outcome: Outcome, content: Content, firstMs: number, nowMs: number): boolean =>
  looksRefused(outcome, content) &&
  content.blocks.some(({ type }) => type === 'image') &&
  nowMs - firstMs < fileProcessingMs;

export const looksRefusedNote = (outcome: Outcome): string => {
  const details = outcome.kind === 'refused' ? outcome.details.join('; ') : '';
  return `The platform refused the blocks of a message; its text went out alone. ${details}`.trim();
};

const note = (words: string): Block & { readonly elements: readonly unknown[] } => ({
  type: 'context',
  elements: [{ type: 'plain_text', text: words, emoji: false }],
});

/** The same message with a line above it. A message of text alone stays one: blocks would hide its text. */
export const headed = <C extends Content>(content: C, words: string): C => ({
  ...content,
  text: `${words} ${content.text}`,
  blocks: content.blocks.length === 0 ? [] : [note(words), ...content.blocks],
});
