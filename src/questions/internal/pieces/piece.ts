import type { Day } from '../../../terms/day.ts';
import type { Level } from '../../../terms/level.ts';
import type { ScheduleDays } from '../../../terms/subscriptions.ts';
import type { Window } from '../../../terms/window.ts';
import type { Crossing, Exposure, TailModel, Wish } from '../../question.ts';
import type { Fault } from '../faults/fault.ts';

/** What a recogniser knows of some words, before it is clear what the verb makes of them. */
export type Piece =
  | { readonly kind: 'verb' }
  | { readonly kind: 'filler' }
  | { readonly kind: 'unread' }
  | { readonly kind: 'fault'; readonly fault: Fault }
  | { readonly kind: 'ticker'; readonly ticker: string }
  | { readonly kind: 'window'; readonly window: Window }
  | { readonly kind: 'splitDay'; readonly day: Day }
  | { readonly kind: 'level'; readonly level: Level }
  | { readonly kind: 'confidence'; readonly level: Level }
  | { readonly kind: 'power'; readonly level: Level }
  /** A percentage that nothing marks: a level or a size, as the verb has it. */
  | { readonly kind: 'percent'; readonly decimal: string }
  /** A number without a unit. */
  | { readonly kind: 'number'; readonly decimal: string }
  | { readonly kind: 'size'; readonly fraction: number }
  | { readonly kind: 'beyond'; readonly fraction: number }
  | { readonly kind: 'annual' }
  | { readonly kind: 'horizon'; readonly days: number }
  | { readonly kind: 'exposure'; readonly exposure: Exposure }
  | { readonly kind: 'estimation'; readonly returns: number }
  | { readonly kind: 'model'; readonly model: TailModel }
  | { readonly kind: 'side'; readonly side: 'above' | 'below' }
  | { readonly kind: 'log' }
  | { readonly kind: 'robust' }
  | { readonly kind: 'of'; readonly of: 'mean' | 'vol' | 'ratio' }
  | { readonly kind: 'wish'; readonly wish: Wish }
  | { readonly kind: 'topic'; readonly topic: string }
  | { readonly kind: 'verify' }
  | { readonly kind: 'recordId'; readonly id: string }
  | { readonly kind: 'subscriptionId'; readonly id: string }
  /** What is to be done with a digest or a watch. */
  | { readonly kind: 'doing'; readonly doing: Doing }
  | { readonly kind: 'scheduleDays'; readonly days: ScheduleDays }
  | { readonly kind: 'clock'; readonly minutes: number }
  | { readonly kind: 'timeZone'; readonly timeZone: string }
  | { readonly kind: 'watched'; readonly watched: 'var' | 'es' | 'loss' }
  | { readonly kind: 'crossing'; readonly crossing: Crossing };

export type Doing = 'list' | 'now' | 'pause' | 'resume' | 'change' | 'stop';

export type PieceKind = Piece['kind'];

/** A piece and the words it was read from. `assumed` says in words what the reading took for granted. */
export type Placed<P extends Piece = Piece> = {
  readonly piece: P;
  readonly first: number;
  readonly wordCount: number;
  readonly assumed: string | null;
};

export type PieceOf<Kind extends PieceKind> = Extract<Piece, { kind: Kind }>;

const isOfKind =
  <Kind extends PieceKind>(kind: Kind) =>
  (placed: Placed): placed is Placed<PieceOf<Kind>> =>
    placed.piece.kind === kind;

export const allOf = <Kind extends PieceKind>(
  pieces: readonly Placed[],
  kind: Kind,
): readonly Placed<PieceOf<Kind>>[] => pieces.filter(isOfKind(kind));

export const firstOf = <Kind extends PieceKind>(
  pieces: readonly Placed[],
  kind: Kind,
): PieceOf<Kind> | null => pieces.find(isOfKind(kind))?.piece ?? null;

export const has = (pieces: readonly Placed[], kind: PieceKind): boolean =>
  pieces.some(({ piece }) => piece.kind === kind);
