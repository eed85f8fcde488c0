import type { ReadContext } from '../../context.ts';
import { type Fault, instead } from '../faults/fault.ts';
import { asSentence, shownWords } from '../faults/shownWords.ts';
import type { Piece } from '../pieces/piece.ts';
import type { Word } from '../words/word.ts';

export type Line = { readonly words: readonly Word[]; readonly context: ReadContext };

/** A piece and how many words it takes from the place it was looked for. */
export type Found = { readonly piece: Piece; readonly wordCount: number; readonly assumed: string | null };

/** Looks for one kind of thing at a word of the line. */
export type Recogniser = (line: Line, at: number) => Found | null;

export const found = (piece: Piece, wordCount: number, assumed: string | null = null): Found => ({
  piece,
  wordCount,
  assumed,
});

/** What a fault says after naming its words, and what could stand in their place. */
export type Complaint = Pick<Fault, 'code'> & { readonly says: string; readonly instead: readonly string[] };

/** A fault about `wordCount` words from `first` on; the message begins with those words. */
export const faultAt = (line: Line, first: number, wordCount: number, complaint: Complaint): Fault => ({
  code: complaint.code,
  message: asSentence(`${shownWords(line.words, first, wordCount)} ${complaint.says}`),
  first,
  wordCount,
  repairs: instead(first, wordCount, complaint.instead),
});

export const foundFault = (fault: Fault, wordCount: number): Found =>
  found({ kind: 'fault', fault }, wordCount);
