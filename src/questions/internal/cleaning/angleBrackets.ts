/**
 * Stands for the mention of a person, a group or a channel. It is an unread word of its own, so that nobody is
 * mentioned a second time by the reply. (U+FFFC, the object replacement character.)
 */
export const mentionMark = '\uFFFC';

/** What a `<…>` of the platform stood for; `offset` is where the shown text begins inside the brackets. */
export type Bracketed =
  | { readonly kind: 'mention'; readonly id: string }
  | { readonly kind: 'link'; readonly shown: string; readonly offset: number };

const schemePattern = /^[a-z][a-z0-9+.-]{0,15}:(?:\/\/)?/i;

/** The platform's reading of the text between `<` and `>`, or null where the brackets are just brackets. */
export const readBracketed = (inside: string): Bracketed | null => {
  if (/^[@#!]/.test(inside)) return { kind: 'mention', id: inside.slice(1).split('|', 1)[0] ?? '' };
  const scheme = schemePattern.exec(inside)?.[0];
  if (scheme === undefined) return null;
  const bar = inside.indexOf('|');
  if (bar >= 0) return { kind: 'link', shown: inside.slice(bar + 1), offset: bar + 1 };
  const target = inside.slice(scheme.length);
  const end = target.search(/[/?#:]/);
  return { kind: 'link', shown: end < 0 ? target : target.slice(0, end), offset: scheme.length };
};
