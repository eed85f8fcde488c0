import type { Wish } from '../../question.ts';
import { type Attempt, attained, type Fault, faulty } from '../faults/fault.ts';
import { allOf, type Placed } from '../pieces/piece.ts';
import type { Line } from '../recognisers/recogniser.ts';
import type { ReadLine, VerbReader } from '../verbs/verbReader.ts';
import { checkPieces } from './checkPieces.ts';
import { checkTickers } from './checkTickers.ts';
import { findHead } from './head.ts';
import { placePieces } from './placePieces.ts';
import { unreadFault } from './unreadWords.ts';

export type WholeLine = ReadLine & { readonly wishes: readonly Wish[] };

/** A recogniser's own fault or unread words, whichever stands first in the line. */
export const recognitionFault = (line: Line, reader: VerbReader, pieces: readonly Placed[]): Fault | null => {
  const [recognised] = allOf(pieces, 'fault');
  const fault = recognised?.piece.fault ?? null;
  const unread = unreadFault(line, reader, pieces);
  if (fault === null || unread === null) return fault ?? unread;
  return fault.first < unread.first ? fault : unread;
};

/** Settles the pieces by the verb, checks them and makes the questions. */
export const assemble = (line: Line, reader: VerbReader, pieces: readonly Placed[]): Attempt<ReadLine> => {
  const settled = reader.settle(line, pieces);
  if (!settled.ok) return settled;
  const fault = checkPieces(line, reader, settled.value) ?? checkTickers(line, reader, settled.value);
  if (fault !== null) return faulty(fault);
  const tickers = allOf(settled.value, 'ticker').map(({ piece }) => piece.ticker);
  return reader.read({ ...line, pieces: settled.value, tickers });
};

/** Reads the words of one question: find the verb, recognise the pieces, settle them by the verb, assemble. */
export const readLine = (line: Line): Attempt<WholeLine> => {
  const head = findHead(line);
  if (!head.ok) return head;
  const { reader } = head.value;
  const pieces = placePieces(line, head.value);
  const fault = recognitionFault(line, reader, pieces);
  if (fault !== null) return faulty(fault);
  const read = assemble(line, reader, pieces);
  if (!read.ok) return read;
  const assumedByPieces = pieces.flatMap(({ assumed }) => assumed ?? []);
  return attained({
    questions: read.value.questions,
    assumed: [...head.value.assumed, ...assumedByPieces, ...read.value.assumed],
    wishes: allOf(pieces, 'wish').map(({ piece }) => piece.wish),
  });
};
