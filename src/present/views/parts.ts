import { clipped } from '../limits/cut.ts';
import { platformLimits as limits } from '../limits/platformLimits.ts';

/** A form or a home page as the platform takes it. Every word in it is plain text. */
export type View = {
  readonly type: 'modal' | 'home';
  readonly callback_id: string;
  readonly blocks: readonly object[];
  readonly [more: string]: unknown;
};

export type Option = { readonly text: string; readonly value: string };

export const words = (text: string, most: number) => ({
  type: 'plain_text' as const,
  text: clipped(text === '' ? '–' : text, most),
  emoji: false,
});

export const section = (text: string, more: object = {}) => ({
  type: 'section' as const,
  text: words(text, limits.section.text),
  ...more,
});

export const header = (text: string) => ({ type: 'header' as const, text: words(text, limits.header.text) });

export const quiet = (text: string) => ({
  type: 'context' as const,
  elements: [words(text, limits.section.text)],
});

export type ShownOption = { readonly text: ReturnType<typeof words>; readonly value: string };

/** Options whose value would be cut cannot be chosen, and are left out. */
export const options = (all: readonly Option[], most: number): readonly ShownOption[] =>
  all
    .filter(({ value }) => value.length <= limits.select.optionValue)
    .slice(0, most)
    .map(({ text, value }) => ({ text: words(text, limits.select.optionText), value }));
