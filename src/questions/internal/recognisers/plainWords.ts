import type { Piece } from '../pieces/piece.ts';
import { found, type Recogniser } from './recogniser.ts';

/** Single words that mean one thing wherever they stand. */
const meanings: readonly (readonly [string, Piece])[] = [
  ['above', { kind: 'side', side: 'above' }],
  ['below', { kind: 'side', side: 'below' }],
  ['log', { kind: 'log' }],
  ['robust', { kind: 'robust' }],
  ['mean', { kind: 'of', of: 'mean' }],
  ['vol', { kind: 'of', of: 'vol' }],
  ['ratio', { kind: 'of', of: 'ratio' }],
];

export const plainWords: readonly { readonly words: readonly string[]; readonly recognise: Recogniser }[] =
  meanings.map(([word, piece]) => ({ words: [word], recognise: () => found(piece, 1) }));
